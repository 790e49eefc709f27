import { createTransport } from 'nodemailer';

type Mail = { to: string; subject: string; text: string };

export type Mailer = {
  /** @throws Error when the mail server does not take it */
  send(mail: Mail): Promise<void>;
  close(): void;
};

/**
 * Sends mail over SMTP.
 *
 * @param mailUrl smtp:// or smtps://, with user and password where the server wants them
 * @param from sender of every mail
 */
export function createMailer(mailUrl: string, from: string): Mailer {
  const transport = createTransport(mailUrl, { from });
  return {
    async send(mail) {
      await transport.sendMail(mail);
    },
    close: () => transport.close(),
  };
}
