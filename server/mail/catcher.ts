import { randomBytes } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { open, readdir, rename, rm } from 'node:fs/promises';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { SMTPServer } from 'smtp-server';

/** Only the newest mails are kept. */
const MAILS_KEPT = 500;
const MAIL_BYTES = 5_000_000;

/** A mail server that sends nothing on: what it is given, it keeps as files to read. */
export interface MailCatcher {
  smtpUrl: string;
  stop: () => Promise<void>;
}

/**
 * Catches mail on a free loopback port and keeps each one in `folder`, so that Spyhole can be tried
 * whole, links in mails included, without a mail server.
 */
export async function startMailCatcher(folder: string): Promise<MailCatcher> {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: MAIL_BYTES,
    logger: false,
    onData: (stream, _session, done) => {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        if (stream.sizeExceeded) {
          done(Object.assign(new Error('This mail is too large.'), { responseCode: 552 }));
          return;
        }
        keep(folder, Buffer.concat(chunks)).then(
          () => done(),
          () => done(Object.assign(new Error('There is no room.'), { responseCode: 452 })),
        );
      });
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  // A client that goes away in the middle is its own concern.
  server.on('error', () => undefined);
  const { port } = server.server.address() as AddressInfo;
  return {
    smtpUrl: `smtp://127.0.0.1:${port}`,
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

/** The sender is told "kept" only when the mail is on disk, whole. */
async function keep(folder: string, mail: Buffer): Promise<void> {
  const time = new Date().toISOString().replaceAll(/[-:.]/g, '');
  const path = join(folder, `${time}-${randomBytes(4).toString('hex')}.eml`);
  const file = await open(`${path}.part`, 'wx', 0o600);
  try {
    await file.writeFile(mail);
    await file.sync();
  } finally {
    await file.close();
  }
  await rename(`${path}.part`, path);
  await prune(folder);
}

async function prune(folder: string): Promise<void> {
  const names = (await readdir(folder)).filter((name) => name.endsWith('.eml')).sort();
  const old = names.slice(0, Math.max(0, names.length - MAILS_KEPT));
  await Promise.all(old.map((name) => rm(join(folder, name), { force: true })));
}
