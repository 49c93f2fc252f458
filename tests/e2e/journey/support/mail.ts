import { type CaughtMail } from "@/tests/e2e/support/caught-mails";
import { expect } from "./patient-expect";

/** Waits until these people, and nobody else, have got a mail with this subject; answers the mails. */
export async function mailsArrived(
  mails: () => Promise<CaughtMail[]>,
  subject: string,
  to: readonly string[],
): Promise<CaughtMail[]> {
  const wanted = [...to].sort();
  const arrived = async () => (await mails()).filter((mail) => mail.subject === subject);
  await expect.poll(async () => (await arrived()).flatMap((mail) => mail.to).sort()).toEqual(wanted);
  return arrived();
}
