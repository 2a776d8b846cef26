import { describe, expect } from 'vitest';
import { createMailer } from '../../server/mail/mailer.ts';
import { mailHandler } from '../../server/mail/mail-handler.ts';
import { enqueue, type MailJob } from '../../server/outbox/outbox.ts';
import { workOnce } from '../../server/outbox/worker.ts';
import { type Api, startApi, test } from '../support/api.ts';
import { aMember } from '../support/builders.ts';
import { takeMails } from '../support/mails.ts';
import { type SmtpTestServer, startSmtp } from '../support/smtp.ts';

interface JobRow {
  done_at: Date | null;
  given_up_at: Date | null;
  last_error: string;
}

/** The application with a mail server of its own, and jobs that are due at once. */
async function withSmtp(
  db: Api['db'],
  work: (api: Api, smtp: SmtpTestServer, send: () => Promise<JobRow | undefined>) => Promise<void>,
): Promise<void> {
  const smtp = await startSmtp();
  const api = await startApi(db, {
    config: {
      mail: { smtpUrl: smtp.url, from: 'Spyhole <spyhole@example.org>', caughtFolder: null },
    },
  });
  const send = async (): Promise<JobRow | undefined> => {
    await db('outbox').update({ available_at: db.raw('NOW(3)') });
    await workOnce(api.deps, 'mail', mailHandler(api.deps));
    return db('outbox').orderBy('id', 'desc').first<JobRow | undefined>();
  };
  try {
    await work(api, smtp, send);
  } finally {
    await api.stop();
    await smtp.stop();
  }
}

const promise = (api: Api, job: MailJob, key: string = job.kind): Promise<void> =>
  enqueue(api.db, 'mail', key, job);

describe('a mail', () => {
  test('goes out once, in plain text, to the stored address only', async ({ committedDb }) => {
    await withSmtp(committedDb, async (api, smtp, send) => {
      const member = await aMember(api.db, { emailVerified: false });
      await promise(api, { kind: 'verify-email', memberId: member.id });
      expect((await send())?.done_at).not.toBeNull();
      await send();
      expect(smtp.received).toHaveLength(1);
      const [mail] = smtp.received;
      expect(mail?.recipients).toEqual([member.email]);
      expect(mail?.source).toMatch(/^From: Spyhole <spyhole@example\.org>\r?$/m);
      expect(mail?.source).toMatch(/^Subject: Confirm your address\r?$/m);
      expect(mail?.source).toMatch(/^Content-Type: text\/plain; charset=utf-8\r?$/m);
      expect(mail?.source).not.toMatch(/text\/html/);
    });
  });

  test('has one recipient and no new header, whatever a name, title or address holds', async ({
    committedDb,
  }) => {
    await withSmtp(committedDb, async (api, smtp) => {
      const mailer = createMailer(api.deps.config.mail);
      await mailer
        .send(
          {
            to: 'one@example.org\r\nBcc: many@example.org',
            subject: 'Published: plates\r\nBcc: many@example.org\r\n\r\nA body of my own',
            text: 'Hello\r\nBcc: many@example.org,',
          },
          { messageId: '<1@example.org>', onHandingOver: () => Promise.resolve() },
        )
        .catch(() => undefined);
      await mailer.send(
        {
          to: 'one@example.org',
          subject: 'Published: plates\r\nBcc: many@example.org\u2028X-Own: 1',
          text: 'Hello\r\nBcc: many@example.org,\r\n.\r\nRCPT TO:<many@example.org>\r\n',
        },
        { messageId: '<2@example.org>', onHandingOver: () => Promise.resolve() },
      );
      expect(smtp.received.flatMap(({ recipients }) => recipients)).not.toContain(
        'many@example.org',
      );
      const last = smtp.received.at(-1);
      expect(last?.recipients).toEqual(['one@example.org']);
      const headers = (last?.source.split(/\r?\n\r?\n/)[0] ?? '').replace(/\r?\n[ \t]+/g, ' ');
      expect(headers).not.toMatch(/^(Bcc|X-Own):/im);
    });
  });

  test('waits for a server that is away or says later, and then goes out once', async ({
    committedDb,
  }) => {
    await withSmtp(committedDb, async (api, smtp, send) => {
      const member = await aMember(api.db);
      await promise(api, { kind: 'password-changed', memberId: member.id });
      await smtp.stop();
      const away = await send();
      expect(away).toMatchObject({ done_at: null, given_up_at: null });
      expect(away?.last_error).not.toBe('');
      const back = await startSmtp(Number(new URL(smtp.url).port));
      try {
        back.mood = 'later';
        const later = await send();
        expect(later).toMatchObject({ done_at: null, given_up_at: null });
        expect(later?.last_error).not.toContain('@');
        back.mood = 'take';
        expect((await send())?.done_at).not.toBeNull();
        expect(back.received.map(({ recipients }) => recipients)).toEqual([[member.email]]);
      } finally {
        await back.stop();
      }
    });
  });

  test('is given up when the server refuses its recipient for good', async ({ committedDb }) => {
    await withSmtp(committedDb, async (api, smtp, send) => {
      const member = await aMember(api.db);
      smtp.mood = 'refuse';
      await promise(api, { kind: 'password-changed', memberId: member.id });
      const job = await send();
      expect(job?.given_up_at).not.toBeNull();
      expect(job?.last_error).toBe('The mail server refused this mail (550).');
    });
  });

  test('is not sent again when the line breaks after the whole of it', async ({ committedDb }) => {
    await withSmtp(committedDb, async (api, smtp, send) => {
      const member = await aMember(api.db);
      smtp.mood = 'drop';
      await promise(api, { kind: 'password-changed', memberId: member.id });
      expect((await send())?.done_at).not.toBeNull();
      smtp.mood = 'take';
      await send();
      expect(smtp.received).toHaveLength(1);
    });
  });

  test('is not sent again when the worker is killed between sending and marking', async ({
    committedDb,
  }) => {
    await withSmtp(committedDb, async (api, smtp, send) => {
      const member = await aMember(api.db);
      await promise(api, { kind: 'password-changed', memberId: member.id });
      const handler = mailHandler(api.deps);
      // Sends, and then never comes back to say so.
      const killed = workOnce(api.deps, 'mail', {
        ...handler,
        handle: async (job) => {
          await handler.handle(job);
          await new Promise(() => undefined);
        },
      });
      void killed;
      while (smtp.received.length === 0) await new Promise((resolve) => setTimeout(resolve, 20));
      await api.db('outbox').update({ leased_until: api.db.raw('NOW(3) - INTERVAL 1 SECOND') });
      expect((await send())?.done_at).not.toBeNull();
      expect(smtp.received).toHaveLength(1);
    });
  });

  test('is sent by the next worker when the first is killed before sending', async ({
    committedDb,
  }) => {
    await withSmtp(committedDb, async (api, smtp, send) => {
      const member = await aMember(api.db);
      await promise(api, { kind: 'password-changed', memberId: member.id });
      void workOnce(api.deps, 'mail', {
        ...mailHandler(api.deps),
        handle: () => new Promise(() => undefined),
      });
      const leased = () =>
        api.db('outbox').whereNotNull('leased_until').first<JobRow | undefined>();
      while (!(await leased())) await new Promise((resolve) => setTimeout(resolve, 20));
      await api.db('outbox').update({ leased_until: api.db.raw('NOW(3) - INTERVAL 1 SECOND') });
      expect((await send())?.done_at).not.toBeNull();
      expect(smtp.received).toHaveLength(1);
    });
  });
});

describe('mails about notes', () => {
  /** A note with one revision; its title has what a title must not bring into a mail. */
  async function aNote(api: Api, authorId: number): Promise<number> {
    const [kiln] = await api.db('kilns').insert({ keeper_id: authorId, name: 'The drum' });
    await api.db('kiln_versions').insert({ kiln_id: kiln, version: 1, fields: '{}' });
    const [note] = await api.db('notes').insert({ author_id: authorId, draft: '{}' });
    await api.db('note_revisions').insert({
      note_id: note,
      number: 1,
      fields: JSON.stringify({ title: 'Plates\n<b>wet</b> day' }),
      story_html: '',
      kiln_id: kiln,
      kiln_version: 1,
      findings: '[]',
      checks: '[]',
      facts: '{}',
    });
    return Number(note);
  }

  test('go to those who want them, say the reason, and link to the note', async ({ api }) => {
    const member = await aMember(api.db);
    const noteId = await aNote(api, member.id);
    const memberId = member.id;
    const reason = 'The shelf is missing.\nAnd the wind.';
    await promise(api, { kind: 'note-published', memberId, noteId, auditReason: '' });
    await promise(api, { kind: 'note-sent-back', memberId, noteId, auditReason: reason });
    await promise(api, { kind: 'note-declined', memberId, noteId, auditReason: reason });
    await promise(api, { kind: 'note-taken-down', memberId, noteId, auditReason: reason });
    await promise(api, { kind: 'note-tried', memberId, noteId, byNoteId: noteId });
    const mails = await takeMails(api);
    expect(mails.map(({ subject }) => subject).sort()).toEqual([
      'Not published: Plates <b>wet</b> day',
      'Published: Plates <b>wet</b> day',
      'Sent back: Plates <b>wet</b> day',
      'Somebody tried it: Plates <b>wet</b> day',
      'Taken down: Plates <b>wet</b> day',
    ]);
    const sentBack = mails.find(({ subject }) => subject.startsWith('Sent back'));
    expect(sentBack?.text).toContain('> The shelf is missing.\n> And the wind.');
    expect(sentBack?.text).toContain(`${api.baseUrl}/write/${String(noteId)}`);
    const published = mails.find(({ subject }) => subject.startsWith('Published'));
    expect(published?.text).toContain(`${api.baseUrl}/notes/${String(noteId)}`);
  });

  test('stay away from members who do not want them, are suspended or unconfirmed', async ({
    api,
  }) => {
    const author = await aMember(api.db);
    const noteId = await aNote(api, author.id);
    const silent = {
      decisions: false,
      triedIt: false,
      questions: false,
      savedSearches: false,
      desk: false,
    };
    const nobody = [
      await aMember(api.db, { settings: { mails: silent } }),
      await aMember(api.db, { suspended: true }),
      await aMember(api.db, { emailVerified: false }),
    ];
    for (const [index, { id: memberId }] of nobody.entries()) {
      const key = String(index);
      await promise(api, { kind: 'note-published', memberId, noteId, auditReason: '' }, `p${key}`);
      await promise(api, { kind: 'note-tried', memberId, noteId, byNoteId: noteId }, `t${key}`);
    }
    // For the desk: only moderators, and only those who asked for it.
    const wish = {
      mails: { decisions: true, triedIt: true, questions: true, savedSearches: true, desk: true },
    };
    const staff = [
      await aMember(api.db, { role: 'moderator' }),
      await aMember(api.db, { role: 'member', settings: wish }),
      await aMember(api.db, { role: 'moderator', settings: wish }),
    ];
    for (const { id: memberId } of staff) {
      await enqueue(api.db, 'mail', `desk:${String(memberId)}`, {
        kind: 'note-handed-in',
        memberId,
        noteId,
      });
    }
    const mails = await takeMails(api);
    expect(mails.map(({ to }) => to)).toEqual([staff[2]?.email]);
    expect(mails[0]?.text).toContain(`/desk/${String(noteId)}`);
  });
});
