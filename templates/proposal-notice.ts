import { html } from "./html";

export interface MailText {
  subject: string;
  text: string;
  html: string;
}

/** Who gets the mail, and where this installation is found. */
export interface MailFrame {
  recipientName: string;
  /** "http://127.0.0.1:3000" */
  baseUrl: string;
}

/** What every notice about a proposal names. It tells the number and where the sheet is, and no figure of the budget. */
export interface ProposalFacts {
  productCode: string;
  productName: string;
  /** "TF2-CP-04" */
  label: string;
  /** As in the URL of the sheet. */
  proposalNumber: number;
}

interface Notice {
  subject: string;
  sentences: readonly string[];
  listing?: readonly string[];
}

const CLOSING = "Nothing can be approved by answering this mail; what counts is on the sheet.";

/** One layout for every notice, as plain text and as HTML. */
export function proposalNotice(frame: MailFrame, facts: ProposalFacts, notice: Notice): MailText {
  const { productCode, productName, label, proposalNumber } = facts;
  const link = `${frame.baseUrl.replace(/\/+$/, "")}/products/${productCode}/proposals/${proposalNumber}`;
  const sheet = `${label}, ${productName}`;
  const listing = notice.listing ?? [];
  const text = [
    `${frame.recipientName},`,
    ...notice.sentences,
    ...(listing.length > 0 ? [listing.map((row) => `- ${row}`).join("\n")] : []),
    `${sheet}\n${link}`,
    CLOSING,
  ].join("\n\n");
  const body = html`<!doctype html>
    <html lang="en">
      <body style="font-family: sans-serif; line-height: 1.5">
        <p>${frame.recipientName},</p>
        ${notice.sentences.map((sentence) => html`<p>${sentence}</p>`)}
        ${
          listing.length > 0
            ? html`<ul>
                ${listing.map((row) => html`<li>${row}</li>`)}
              </ul>`
            : ""
        }
        <p><a href="${link}">${sheet}</a></p>
        <p>${CLOSING}</p>
      </body>
    </html>`;
  return { subject: notice.subject, text: `${text}\n`, html: `${body.text}\n` };
}
