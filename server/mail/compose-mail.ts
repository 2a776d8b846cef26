import type { Knex } from 'knex';
import { paths } from '#shared/paths.ts';
import {
  type Account,
  findAccountByEmail,
  findAccountById,
} from '../accounts/account-repository.ts';
import { makeMailToken } from '../accounts/mail-tokens.ts';
import type { Deps } from '../deps.ts';
import type { MailJob } from '../outbox/outbox.ts';
import { wantsNews } from '../saved-searches/wants-news.ts';
import { disputeLetter } from './dispute-letter.ts';
import type { Letter } from './letter.ts';
import type { Mail } from './mailer.ts';
import { alreadyJoinedMail } from './messages/already-joined.ts';
import { changeEmailMail } from './messages/change-email.ts';
import { emailChangedMail } from './messages/email-changed.ts';
import { noteDeclinedMail } from './messages/note-declined.ts';
import { noteHandedInMail } from './messages/note-handed-in.ts';
import { notePublishedMail } from './messages/note-published.ts';
import { noteSentBackMail } from './messages/note-sent-back.ts';
import { noteTakenDownMail } from './messages/note-taken-down.ts';
import { noteTriedMail } from './messages/note-tried.ts';
import { passwordChangedMail } from './messages/password-changed.ts';
import { resetPasswordMail } from './messages/reset-password.ts';
import { verifyEmailMail } from './messages/verify-email.ts';
import { newsLetter } from './news-letter.ts';
import { questionLetter } from './question-letter.ts';
import { findNoteTitle } from './note-title.ts';

/**
 * The mail of a job as things are now, or null when it is no longer wanted: the address is confirmed
 * by now, the member is suspended or does not want mails of this kind, the note is gone. Links start
 * with the configured address of the site, never with what a request said; a token stands in the
 * fragment, which browsers send to nobody.
 */
export async function composeMail(
  { db, config }: Pick<Deps, 'db' | 'config'>,
  job: MailJob,
): Promise<Mail | null> {
  const member = await findAccountById(db, job.memberId);
  if (!member || !wants(member, job)) return null;
  const link = (path: string): string => `${config.publicUrl}${path}`;
  const written =
    job.kind === 'news-of-searches'
      ? await newsLetter(db, config, job, member, link)
      : await writeLetter(db, job, member, link);
  return written && { to: addressFor(job, member), ...written };
}

function addressFor(job: MailJob, member: Account): string {
  if (job.kind === 'change-email') return job.newEmail;
  if (job.kind === 'email-changed') return job.oldEmail;
  return member.email;
}

/** Mails about one's own account always go out; the rest as the member has set it. */
function wants(member: Account, job: MailJob): boolean {
  const { mails } = member.settings;
  switch (job.kind) {
    case 'note-published':
    case 'note-sent-back':
    case 'note-declined':
    case 'note-taken-down':
    case 'dispute-answered':
      return mails.decisions && !member.suspended && member.emailVerified;
    case 'question-asked':
    case 'question-answered':
      return mails.questions && !member.suspended && member.emailVerified;
    case 'note-tried':
      return mails.triedIt && !member.suspended && member.emailVerified;
    case 'news-of-searches':
      return wantsNews(member);
    case 'note-handed-in':
      return mails.desk && !member.suspended && member.emailVerified && member.role !== 'member';
    case 'verify-email':
      return !member.emailVerified && !member.suspended;
    case 'already-joined':
    case 'reset-password':
    case 'password-changed':
    case 'change-email':
    case 'email-changed':
      return true;
  }
}

async function writeLetter(
  db: Knex,
  job: Exclude<MailJob, { kind: 'news-of-searches' }>,
  member: Account,
  link: (path: string) => string,
): Promise<Letter | null> {
  const { id, name } = member;
  switch (job.kind) {
    case 'verify-email':
      return verifyEmailMail(
        name,
        link(`${paths.confirmAddress}#${await makeMailToken(db, id, 'verify-email')}`),
      );
    case 'already-joined':
      return alreadyJoinedMail(name, {
        signIn: link(paths.signIn()),
        forgot: link(paths.forgottenPassword),
      });
    case 'reset-password':
      return resetPasswordMail(
        name,
        link(`${paths.newPassword}#${await makeMailToken(db, id, 'reset')}`),
      );
    case 'password-changed':
      return passwordChangedMail(name, link(paths.forgottenPassword));
    case 'change-email': {
      // Somebody else's by now: nothing is sent, and the asker is not told whose it is.
      if (await findAccountByEmail(db, job.newEmail)) return null;
      const token = await makeMailToken(db, id, 'change-email', job.newEmail);
      return changeEmailMail(name, link(`${paths.confirmAddress}#${token}`));
    }
    case 'email-changed':
      return emailChangedMail(name, link(paths.front));
    case 'note-tried': {
      const [own, follow] = await Promise.all([
        findNoteTitle(db, job.noteId),
        findNoteTitle(db, job.byNoteId),
      ]);
      if (own === null || follow === null) return null;
      const followLink = link(paths.note(job.byNoteId, ''));
      return noteTriedMail(name, { title: own }, { title: follow, link: followLink });
    }
    case 'question-asked':
    case 'question-answered':
      return questionLetter(db, job, name, link(paths.note(job.noteId, '')));
    case 'dispute-answered': {
      const title = await findNoteTitle(db, job.noteId);
      if (title === null) return null;
      const to = { name, units: member.settings };
      const note = { title, link: link(paths.note(job.noteId, '')) };
      return disputeLetter(db, job.disputeId, to, note);
    }
    case 'note-handed-in':
    case 'note-published':
    case 'note-sent-back':
    case 'note-declined':
    case 'note-taken-down': {
      const title = await findNoteTitle(db, job.noteId);
      if (title === null) return null;
      if (job.kind === 'note-handed-in')
        return noteHandedInMail(name, title, link(paths.deskNote(job.noteId)));
      if (job.kind === 'note-published')
        return notePublishedMail(name, title, link(paths.note(job.noteId, '')));
      const own = link(paths.write(job.noteId));
      const reason = job.auditReason.trim();
      if (job.kind === 'note-sent-back') return noteSentBackMail(name, title, own, reason);
      if (job.kind === 'note-declined') return noteDeclinedMail(name, title, own, reason);
      return noteTakenDownMail(name, title, own, reason);
    }
  }
}
