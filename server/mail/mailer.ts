import { Transform } from 'node:stream';
import nodemailer from 'nodemailer';
import { GiveUp } from '../outbox/job.ts';

export interface Mail {
  readonly to: string;
  readonly subject: string;
  /** Plain text is all that is sent: nothing in it can run, load or hide. */
  readonly text: string;
  /** Header fields beside the usual ones: name → value. */
  readonly headers?: Readonly<Record<string, string>>;
}

export interface SendOptions {
  /** The same for every try at one mail, so that a mail server can tell a repeat. */
  readonly messageId: string;
  /** Called when all of the mail is with the server except the sign that it has ended. */
  readonly onHandingOver: () => Promise<void>;
}

export interface Mailer {
  /**
   * @returns true when the server has taken it, false when the line broke at the very end, so that it
   * cannot be known
   * @throws GiveUp when the server refuses it for good; Error when it may be tried again
   */
  readonly send: (mail: Mail, options: SendOptions) => Promise<boolean>;
}

const TIMEOUTS = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000 };

interface LastByte {
  readonly onLastByte: () => Promise<void>;
}
type LetterWithEnd = Parameters<ReturnType<typeof nodemailer.createTransport>['sendMail']>[0] &
  LastByte;

/** One line, without anything that could begin another header. */
const oneLine = (text: string): string => text.replace(/[\p{Cc}\u2028\u2029]+/gu, ' ').trim();

export function createMailer({ smtpUrl, from }: { smtpUrl: string; from: string }): Mailer {
  const url = new URL(smtpUrl);
  const transport = nodemailer.createTransport(
    {
      host: url.hostname.replace(/^\[|\]$/g, ''),
      port: Number(url.port || (url.protocol === 'smtps:' ? 465 : 587)),
      secure: url.protocol === 'smtps:',
      ...(url.username === ''
        ? {}
        : {
            auth: {
              user: decodeURIComponent(url.username),
              pass: decodeURIComponent(url.password),
            },
          }),
      ...TIMEOUTS,
      disableFileAccess: true,
      disableUrlAccess: true,
    },
    { from: oneLine(from) },
  );
  transport.use('stream', (mail, next) => {
    const { onLastByte } = mail.data as LastByte;
    // Holds back the end of the mail until `onLastByte` has been done.
    mail.message.transform(
      () =>
        new Transform({
          transform: (chunk, _encoding, done) => done(null, chunk),
          flush: (done) => {
            onLastByte().then(() => done(), done);
          },
        }),
    );
    next();
  });
  return {
    send: async ({ to, subject, text, headers }, { messageId, onHandingOver }) => {
      const sent = { handedOver: false };
      try {
        await transport.sendMail({
          to: { name: '', address: oneLine(to) },
          subject: oneLine(subject),
          text,
          messageId,
          textEncoding: 'quoted-printable',
          headers: {
            ...Object.fromEntries(
              Object.entries(headers ?? {}).map(([name, value]) => [name, oneLine(value)]),
            ),
            'Auto-Submitted': 'auto-generated',
          },
          onLastByte: async () => {
            await onHandingOver();
            sent.handedOver = true;
          },
        } as LetterWithEnd);
        return true;
      } catch (error) {
        const { responseCode } = error as { responseCode?: number };
        if (responseCode !== undefined && responseCode >= 500) {
          throw new GiveUp(`The mail server refused this mail (${String(responseCode)}).`);
        }
        if (sent.handedOver && responseCode === undefined) return false;
        throw error;
      }
    },
  };
}
