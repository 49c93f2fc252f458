import { z } from "zod";
import { emailOf, HTTP_PASSWORD, type PersonName } from "./http-people";

/** A person who is signed in, as a program that speaks HTTP and is no browser. */
export interface HttpPerson {
  address: string;
  cookie: string;
  userId: number;
}

/** Signs in as the form does: with the token against forged requests, then name and password. */
export async function signInOverHttp(address: string, name: PersonName, password = HTTP_PASSWORD): Promise<HttpPerson> {
  const jar = new Map<string, string>();
  const tokenAnswer = await fetch(`${address}/api/auth/csrf`);
  keepCookies(jar, tokenAnswer);
  const { csrfToken } = z.object({ csrfToken: z.string() }).parse(await tokenAnswer.json());

  const typed = { csrfToken, email: emailOf(name), password, json: "true" };
  const signedIn = await fetch(`${address}/api/auth/callback/credentials`, {
    method: "POST",
    redirect: "manual",
    headers: { cookie: cookieHeader(jar) },
    body: new URLSearchParams(typed),
  });
  keepCookies(jar, signedIn);
  if (!jar.has("leeboard")) throw new Error(`${name} was not signed in: ${signedIn.status} ${await signedIn.text()}`);

  const cookie = cookieHeader(jar);
  const session = await fetch(`${address}/api/auth/session`, { headers: { cookie } });
  const { userId } = z.object({ userId: z.int() }).parse(await session.json());
  return { address, cookie, userId };
}

/** Whoever has no session: a cookie of nobody. */
export function nobody(address: string): HttpPerson {
  return { address, cookie: "", userId: 0 };
}

function keepCookies(jar: Map<string, string>, answer: Response): void {
  for (const line of answer.headers.getSetCookie()) {
    const [, name, value] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
    if (name !== undefined && value !== undefined) jar.set(name, value);
  }
}

function cookieHeader(jar: ReadonlyMap<string, string>): string {
  return [...jar].map(([name, value]) => `${name}=${value}`).join("; ");
}
