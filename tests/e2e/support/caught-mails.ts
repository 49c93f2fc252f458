import { z } from "zod";

const CaughtMail = z.object({
  subject: z.string(),
  to: z.array(z.object({ address: z.string() })),
  text: z.string().optional(),
  headers: z.record(z.string(), z.unknown()),
});

export interface CaughtMail {
  subject: string;
  to: string[];
  text: string;
  /** The same one twice is a mail sent twice. */
  messageId: string;
}

/** Everything the application has sent so far. */
export async function caughtMails(mailAddress: string): Promise<CaughtMail[]> {
  const response = await fetch(`${mailAddress}/api/email`);
  return z
    .array(CaughtMail)
    .parse(await response.json())
    .map(({ subject, to, text, headers }) => ({
      subject,
      to: to.map(({ address }) => address),
      text: text ?? "",
      messageId: String(headers["message-id"]),
    }));
}
