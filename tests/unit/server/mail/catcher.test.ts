import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startMailCatcher, type MailCatcher } from '../../../../server/mail/catcher.ts';
import { listCaughtMails, readCaughtMail } from '../../../../server/mail/read-caught.ts';

let folder: string;
let catcher: MailCatcher;

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'spyhole-mail-'));
  catcher = await startMailCatcher(folder);
});

afterAll(async () => {
  await catcher.stop();
  rmSync(folder, { recursive: true, force: true });
});

async function send(subject: string, text: string, html?: string): Promise<void> {
  const transport = createTransport(catcher.smtpUrl);
  await transport.sendMail({
    from: 'Spyhole <spyhole@localhost>',
    to: 'Ida Lehm <ida@kiln.example>',
    subject,
    text,
    ...(html === undefined ? {} : { html }),
  });
  transport.close();
}

describe('the mail catcher', () => {
  it('keeps a mail whole before it says that it has it, readable with accents and long lines', async () => {
    const link = `http://localhost:3000/confirm?token=${'a1=b2'.repeat(40)}`;
    const text = `Grüße vom Ofen bei 1000 °C: the glaze is 釉.\n\n${link}`;
    await send('Your note “Töpfe” was published, and the desk left a remark on its record', text);
    const [mail] = await listCaughtMails(folder);
    expect(mail).toMatchObject({
      to: 'Ida Lehm <ida@kiln.example>',
      subject: 'Your note “Töpfe” was published, and the desk left a remark on its record',
      text,
    });
    expect(Math.abs((mail?.date?.getTime() ?? 0) - Date.now())).toBeLessThan(60_000);
  });

  it('shows the plain text of a mail that also has a formatted one', async () => {
    await send('Two parts', 'The plain words — all of them.', '<p>The <b>formatted</b> words</p>');
    const [mail] = await listCaughtMails(folder);
    expect(mail?.text).toBe('The plain words — all of them.');
  });

  it('lists the newest first and gives one by its id', async () => {
    await send('Older', 'first');
    await send('Newer', 'second');
    const [newest, before] = await listCaughtMails(folder, 2);
    expect([newest?.subject, before?.subject]).toEqual(['Newer', 'Older']);
    expect(await readCaughtMail(folder, before?.id ?? '')).toEqual(before);
  });

  it('reads no file but its own', async () => {
    writeFileSync(join(folder, 'secret.eml'), 'Subject: hidden\n\nhidden');
    expect(await readCaughtMail(folder, 'secret')).toBeNull();
    expect(await readCaughtMail(folder, '../../etc/passwd')).toBeNull();
    rmSync(join(folder, 'secret.eml'));
  });

  it('keeps the newest 500 only', async () => {
    for (let number = 0; number < 505; number += 1) {
      const name = `20200101T0000${String(number).padStart(5, '0')}Z-00000000.eml`;
      writeFileSync(join(folder, name), 'Subject: old\n\nold');
    }
    await send('The newest', 'kept');
    const names = readdirSync(folder).filter((name) => name.endsWith('.eml'));
    expect(names).toHaveLength(500);
    expect((await listCaughtMails(folder, 1))[0]?.subject).toBe('The newest');
  });
});
