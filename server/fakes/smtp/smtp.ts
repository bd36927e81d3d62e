import { SMTPServer } from 'smtp-server';
import type { LetterStore } from './letter-store.ts';

const LARGEST = 25 * 1024 * 1024;

/** An SMTP server that takes every letter and sends none on. Without sign-in and without TLS: loopback only. */
export function newSmtpServer(store: LetterStore): SMTPServer {
  return new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: LARGEST,
    closeTimeout: 500,
    banner: 'mail catcher: nothing is sent on',
    onData(stream, session, done) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.on('error', done);
      stream.on('end', () => {
        if (stream.sizeExceeded) {
          done(Object.assign(new Error('The letter is too large.'), { responseCode: 552 }));
          return;
        }
        const to = session.envelope.rcptTo.map(({ address }) => address);
        // The sender hears 250 only when the letter is kept.
        store.keep(Buffer.concat(parts), to).then(
          () => done(),
          (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
        );
      });
    },
  });
}
