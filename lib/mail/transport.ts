import { createTransport, type Transporter } from "nodemailer";

export interface OutgoingMail {
  to: { name: string; address: string };
  subject: string;
  text: string;
  html: string;
  messageId: string;
}

/** Hands one mail to a server, or throws. */
export type SendMail = (mail: OutgoingMail) => Promise<void>;

const SENDER = { name: "Leeboard", address: "leeboard@localhost.localdomain" };

const SAFETY = {
  connectionTimeout: 10_000,
  greetingTimeout: 10_000,
  socketTimeout: 20_000,
  disableFileAccess: true,
  disableUrlAccess: true,
};

/** Sends by SMTP_URL, or to the mail catcher of this machine. */
export function smtpTransport(environment: NodeJS.ProcessEnv = process.env): SendMail {
  const transporter = transporterFor(environment);
  const from = environment.LEEBOARD_MAIL_FROM ? { ...SENDER, address: environment.LEEBOARD_MAIL_FROM } : SENDER;
  return async ({ to, subject, text, html, messageId }) => {
    await transporter.sendMail({ from, to, subject, text, html, messageId });
  };
}

function transporterFor({ SMTP_URL, LEEBOARD_MAIL_PORT }: NodeJS.ProcessEnv): Transporter {
  if (SMTP_URL) return createTransport({ url: SMTP_URL, ...SAFETY });
  return createTransport({ host: "127.0.0.1", port: Number(LEEBOARD_MAIL_PORT || 1025), ignoreTLS: true, ...SAFETY });
}
