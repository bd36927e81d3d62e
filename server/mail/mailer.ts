import { createTransport } from 'nodemailer';
import type { Settings } from '../settings.ts';

/** A letter ready to go. */
export interface OutgoingLetter {
  /** The same for every try to send the same letter, so that a receiver can tell a repetition. */
  id: string;
  senderName: string;
  to: string;
  subject: string;
  text: string;
  html: string;
}

export interface Mailer {
  /** Hands a letter to the mail server; rejects unless the server took it. */
  send: (letter: OutgoingLetter) => Promise<void>;
}

export function openMailer({ url, from }: Settings['mail']): Mailer {
  const transport = createTransport({ url, connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000 });
  const host = from.slice(from.lastIndexOf('@') + 1);
  return {
    async send({ id, senderName, to, subject, text, html }) {
      await transport.sendMail({
        messageId: `<${id}@${host}>`,
        from: { name: senderName, address: from },
        to: { name: '', address: to },
        subject,
        text,
        html,
      });
    },
  };
}
