import { createTransport } from "nodemailer";
import { env } from "./env.server.ts";

/** A letter to one person. Plain text always; html where it reads better. */
export interface Letter {
  to: string;
  subject: string;
  text: string;
  html?: string;
}

export interface Mailer {
  /** Hands the letter to the SMTP server. @throws when the server refuses or cannot be reached. */
  send(letter: Letter): Promise<void>;
  close(): void;
}

/**
 * A mailer over SMTP that keeps its connections.
 *
 * @param settings the server (smtp:// or smtps://) and whom letters are from.
 */
export function createMailer(settings: { SMTP_URL: string; MAIL_FROM: string }): Mailer {
  const transport = createTransport({
    url: settings.SMTP_URL,
    pool: true,
    maxConnections: 3,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 20_000,
  });
  return {
    async send(letter) {
      // Named one by one: nodemailer would also fetch files and addresses, if a letter had such fields.
      const { to, subject, text, html } = letter;
      await transport.sendMail({
        from: settings.MAIL_FROM,
        to,
        subject,
        text,
        html,
        disableFileAccess: true,
        disableUrlAccess: true,
      });
    },
    close: () => transport.close(),
  };
}

let mailer: Mailer | undefined;

/** The mailer of this process, made on first use from the settings. */
export function appMailer(): Mailer {
  mailer ??= createMailer(env());
  return mailer;
}
