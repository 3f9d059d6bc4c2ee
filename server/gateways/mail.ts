// The only importer of the mail SDK: hands one finished message to the SMTP server.
import nodemailer from 'nodemailer';

export interface OutgoingMail {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  /** The effect's key, so that a second delivery of the same mail can be told from a new one. */
  readonly key: string;
}

export interface MailGateway {
  send(mail: OutgoingMail): Promise<void>;
  ready(): Promise<void>;
  close(): void;
}

export function createMailGateway(settings: { url: string; from: string; publicUrl: string }): MailGateway {
  const host = new URL(settings.publicUrl).hostname;
  const local = /^smtp:\/\/(127\.0\.0\.1|localhost)[:/]/.test(settings.url);
  const transport = nodemailer.createTransport(
    {
      url: settings.url,
      connectionTimeout: 10_000,
      socketTimeout: 20_000,
      // A server on this machine has no certificate to offer.
      ignoreTLS: local,
    },
    { from: settings.from },
  );
  return {
    send: async (mail) => {
      await transport.sendMail({
        to: mail.to,
        subject: mail.subject,
        text: mail.text,
        html: mail.html,
        messageId: `<${mail.key}@${host}>`,
      });
    },
    ready: async () => {
      await transport.verify();
    },
    close: () => transport.close(),
  };
}
