import type { Body } from "@/app/_components/line-fields/body";
import { METHOD_VERSIONS } from "@/lib/evaluation/methods/method-versions";
import { METHOD_NAMES } from "@/lib/evaluation/methods/method-name";

interface VersionLineProps {
  before: Body | null;
  body: Body;
}

/** That an item goes over to another version of its method: no field of the form asks for it. */
export function VersionLine({ before, body }: VersionLineProps) {
  if (!isAdopted(before, body)) return null;
  const method = METHOD_NAMES.find((known) => known === body.method);
  const published = method && METHOD_VERSIONS[method].find(({ version }) => version === body.methodVersion);

  return (
    <p className="change-bar mb-3 text-sm">
      <span className="font-semibold">
        Version of the method {String(before?.methodVersion)} <span aria-hidden>→</span>
        <span className="sr-only">becomes</span> {String(body.methodVersion)}.
      </span>{" "}
      <span className="text-ink-2">{published?.what}</span>
    </p>
  );
}

/** The same method in another version. */
export function isAdopted(before: Body | null, body: Body): boolean {
  return before !== null && before.method === body.method && before.methodVersion !== body.methodVersion;
}
