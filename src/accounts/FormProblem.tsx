import { Link, useLocation } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { OfflineError, ProblemError } from '../http/client.ts';
import { Notice } from '../ui/Notice.tsx';
import { faultsOf } from './form-faults.ts';

interface Props {
  readonly error: unknown;
  /** Fields of the form; faults of others are said here. */
  readonly fields: readonly string[];
}

/** Why a form was not taken, as far as no field says it. */
export function FormProblem({ error, fields }: Props) {
  const { pathname, search } = useLocation();
  if (error === null || error === undefined) return null;
  const faults = faultsOf(error);
  const elsewhere = faults.filter(({ pointer }) => !fields.includes(pointer));
  if (faults.length > 0 && elsewhere.length === 0) return null;
  const { heading, text } = wordsFor(error, elsewhere);
  return (
    <Notice
      kind="error"
      appeared
      heading={heading}
      action={
        error instanceof ProblemError && error.problem.code === 'sign-in-needed' ? (
          <Link to={paths.signIn(`${pathname}${search}`)} className="link text-small">
            Sign in
          </Link>
        ) : undefined
      }
    >
      {text}
    </Notice>
  );
}

function wordsFor(
  error: unknown,
  elsewhere: readonly { detail: string }[],
): { heading: string; text: string } {
  if (elsewhere.length > 0) {
    return {
      heading: 'Some of this cannot be kept',
      text: elsewhere.map(({ detail }) => detail).join(' '),
    };
  }
  if (error instanceof ProblemError) {
    const { title, detail, retryAfter, code } = error.problem;
    const wait =
      code === 'too-many' && retryAfter !== undefined ? ` That is at ${clockIn(retryAfter)}.` : '';
    // The heading is not said twice.
    const rest = detail.startsWith(title)
      ? detail.slice(title.length).replace(/^[.\s]+/, '')
      : detail;
    return { heading: title, text: rest === '' ? (NEXT[code] ?? '') : `${rest}${wait}` };
  }
  return {
    heading: 'This did not go through',
    text:
      error instanceof OfflineError
        ? error.message
        : 'A part of this page broke. What you typed is still here; try again.',
  };
}

/** What to do about refusals whose title says it all. */
const NEXT: Readonly<Record<string, string>> = {
  'wrong-credentials': 'Look at both once more; capitals count in the password.',
  'sign-in-needed': 'Your session has ended. What you typed stays here until you leave the page.',
  'link-used': 'Each link works once and for a short time; only the newest of several works.',
  busy: 'Try again in a few seconds.',
  away: 'Try again in a moment.',
};

/** The reader's clock after so many seconds, rounded up to the minute. */
function clockIn(seconds: number): string {
  const at = new Date(Math.ceil((Date.now() + seconds * 1000) / 60_000) * 60_000);
  return new Intl.DateTimeFormat('en-GB', { timeStyle: 'short' }).format(at);
}
