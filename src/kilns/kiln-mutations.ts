import { useMutation, useQueryClient } from '@tanstack/react-query';
import { doneSchema } from '#shared/api/accounts.ts';
import { kilnSchema } from '#shared/api/kilns.ts';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { send } from '../http/client.ts';
import { kilnPath, kilnQueries } from './kiln-queries.ts';

/** After any change, what is shown of kilns is asked for anew. */
function useKilnsAnew() {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: kilnQueries.all });
}

export function useAddKiln() {
  const anew = useKilnsAnew();
  return useMutation({
    mutationFn: ({ fields, key }: { fields: KilnFields; key: string }) =>
      send({
        method: 'POST',
        path: '/api/kilns',
        body: { fields },
        headers: { 'Idempotency-Key': key },
        answer: kilnSchema,
      }),
    onSuccess: anew,
  });
}

/** Describes the kiln anew, from the version that was read. */
export function useAlterKiln(kilnId: number) {
  const anew = useKilnsAnew();
  return useMutation({
    mutationFn: ({ fields, from }: { fields: KilnFields; from: number }) =>
      send({
        method: 'PUT',
        path: kilnPath(kilnId),
        body: { fields },
        headers: { 'If-Match': `"v${String(from)}"` },
        answer: kilnSchema,
      }),
    onSuccess: anew,
  });
}

export function useLendKiln(kilnId: number) {
  const anew = useKilnsAnew();
  return useMutation({
    mutationFn: (members: readonly string[]) =>
      send({
        method: 'PUT',
        path: kilnPath(kilnId, '/loans'),
        body: { members },
        answer: kilnSchema,
      }),
    onSuccess: anew,
  });
}

export function useRemoveKilnPicture(kilnId: number) {
  const anew = useKilnsAnew();
  return useMutation({
    mutationFn: () =>
      send({ method: 'DELETE', path: kilnPath(kilnId, '/picture'), answer: doneSchema }),
    onSuccess: anew,
  });
}

export function useRemoveKiln(kilnId: number) {
  const anew = useKilnsAnew();
  return useMutation({
    mutationFn: () => send({ method: 'DELETE', path: kilnPath(kilnId), answer: doneSchema }),
    onSuccess: anew,
  });
}
