import type { Deps } from '../deps.ts';
import type { Handler } from '../outbox/job.ts';
import { composeMail } from './compose-mail.ts';
import { createMailer, type Mailer } from './mailer.ts';

/** A link asked for longer ago than it would have been valid is not sent any more. */
const RESET_REQUEST_VALID_SECONDS = 30 * 60;

/**
 * Sends the mails. Each goes out at most once: when it cannot be known whether the server has taken
 * one, it counts as sent.
 */
export function mailHandler(
  deps: Deps,
  mailer: Mailer = createMailer(deps.config.mail),
): Handler<'mail'> {
  const host = new URL(deps.config.publicUrl).hostname;
  return {
    handle: async (job) => {
      if (job.wasHandedOver) {
        deps.log.warn({ event: 'mail', jobId: job.id, result: 'unknown' }, 'mail');
        return;
      }
      if (job.payload.kind === 'reset-password' && job.ageSeconds > RESET_REQUEST_VALID_SECONDS) {
        return;
      }
      const mail = await composeMail(deps, job.payload);
      if (!mail) return;
      const seen = await mailer.send(mail, {
        messageId: `<spyhole-${String(job.id)}@${host}>`,
        onHandingOver: job.handOver,
      });
      if (!seen) deps.log.warn({ event: 'mail', jobId: job.id, result: 'unknown' }, 'mail');
    },
    atOnce: 4,
    groupOf: (payload) => `${String(payload.memberId)} ${payload.kind}`,
    firstWaitSeconds: 5,
    longestWaitSeconds: 60 * 60,
    giveUpAfterSeconds: 24 * 60 * 60,
  };
}
