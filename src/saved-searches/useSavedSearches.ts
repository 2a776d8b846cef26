import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { savedSearchesSchema, type Asked, type SavedSearches } from '#shared/api/saved-searches.ts';
import { useSession } from '../accounts/useSession.ts';
import { newIdempotencyKey, send } from '../http/client.ts';
import { SAVED_SEARCHES_PATH, savedSearchQueries } from './saved-search-queries.ts';

interface Named {
  readonly name: string;
  readonly search: Asked;
}
interface Changed {
  readonly id: number;
  readonly name: string;
  readonly mails: boolean;
}

const pathOf = (id: number): string => `${SAVED_SEARCHES_PATH}/${String(id)}`;

/** The saved searches with everything that can be done to them; visitors have none. */
export function useSavedSearches({ always = false } = {}) {
  const { me } = useSession();
  const client = useQueryClient();
  const list = useQuery({ ...savedSearchQueries.list(), enabled: always || me !== null });
  const show = (next: SavedSearches): void => {
    client.setQueryData(savedSearchQueries.list().queryKey, next);
  };
  const save = useMutation({
    networkMode: 'always',
    mutationFn: ({ name, search }: Named) =>
      send({
        method: 'POST',
        path: SAVED_SEARCHES_PATH,
        body: { name, search },
        headers: { 'Idempotency-Key': newIdempotencyKey() },
        answer: savedSearchesSchema,
      }),
    onSuccess: show,
  });
  const change = useMutation({
    networkMode: 'always',
    mutationFn: ({ id, name, mails }: Changed) =>
      send({ method: 'PUT', path: pathOf(id), body: { name, mails }, answer: savedSearchesSchema }),
    onSuccess: show,
  });
  const remove = useMutation({
    networkMode: 'always',
    mutationFn: (id: number) =>
      send({ method: 'DELETE', path: pathOf(id), answer: savedSearchesSchema }),
    onSuccess: show,
  });
  return { list, save, change, remove };
}
