import type { QueryClient } from '@tanstack/react-query';
import type { Me, SessionAnswer } from '#shared/api/accounts.ts';
import { rememberToken } from '../http/client.ts';
import { clearBrowserStorage } from './browser-storage.ts';
import { sessionQueries } from './session-queries.ts';

const VISITOR: SessionAnswer = {
  me: null,
  abilities: { write: false, handIn: false, moderate: false, administer: false },
  token: null,
};

/** Somebody has signed in: whatever was read before was read as somebody else. */
export function enterSession(client: QueryClient, answer: SessionAnswer): void {
  rememberToken(answer.token);
  client.removeQueries({ type: 'inactive' });
  client.setQueryData(sessionQueries.current().queryKey, answer);
  void client.invalidateQueries();
}

/**
 * The session has ended: nothing that was read or written in it stays in this browser, except the
 * theme. The page that is in sight goes away first, so that it does not ask for its data again.
 *
 * @param leave takes the reader to a page that is open to everybody
 */
export async function leaveSession(
  client: QueryClient,
  leave: () => void | Promise<void>,
): Promise<void> {
  rememberToken(null);
  clearBrowserStorage();
  client.removeQueries({ type: 'inactive' });
  client.setQueryData(sessionQueries.current().queryKey, VISITOR);
  await leave();
  client.removeQueries({ type: 'inactive' });
  client.getMutationCache().clear();
}

/** What the server answered about the member after a change. */
export function rememberMe(client: QueryClient, me: Me): void {
  client.setQueryData(sessionQueries.current().queryKey, (before) =>
    before === undefined ? before : { ...before, me },
  );
}
