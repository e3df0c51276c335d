import { createTransport, type Transport } from 'nodemailer';

import type { Log } from '@/server/http/log';

/** A mail in plain text. */
export interface Letter {
  to: string;
  subject: string;
  text: string;
}

export interface Mailer {
  /** Sends now and fails loudly. */
  send: (letter: Letter) => Promise<void>;
  /**
   * Sends in the background: the person who caused it need not wait, and learns nothing from the time it takes.
   * A function makes the letter there too; null sends nothing.
   */
  post: (letter: Letter | (() => Promise<Letter | null>)) => void;
  /** Waits for what is under way. */
  settled: () => Promise<void>;
}

type Send = Mailer['send'];

/** Real delivery by SMTP. */
export function smtpSender(smtpUrl: string, from: string): Send {
  const transport = createTransport(smtpUrl, { from });
  return async (letter) => {
    await transport.sendMail(letter);
  };
}

/** No mail server: nodemailer builds the mail all the same and hands it to `keep` in place of the network. */
export function localSender(from: string, keep: (letter: Letter) => Promise<void>): Send {
  const transport: Transport<null> = {
    name: 'local mailbox',
    version: '1',
    send: (mail, done) => {
      const { to, subject, text } = mail.data;
      if (typeof to !== 'string' || typeof text !== 'string') return done(new Error('A mail goes to one address, as text.'), null);
      keep({ to, subject: subject ?? '', text }).then(
        () => done(null, null),
        (error: unknown) => done(error instanceof Error ? error : new Error('The mail could not be kept.'), null),
      );
    },
  };
  const mailer = createTransport(transport, { from });
  return async (letter) => {
    await mailer.sendMail(letter);
  };
}

export function createMailer(send: Send, log: Log): Mailer {
  const underWay = new Set<Promise<void>>();
  return {
    send,
    post: (letter) => {
      const deliver = async () => {
        const ready = typeof letter === 'function' ? await letter() : letter;
        if (ready) await send(ready);
      };
      const sending: Promise<void> = deliver().catch((error: unknown) => log.error('mail-failed', error)).finally(() => underWay.delete(sending));
      underWay.add(sending);
    },
    settled: async () => {
      await Promise.all(underWay);
    },
  };
}
