import type { Knex } from 'knex';
import { kilnFieldsSchema } from '#shared/note/kiln-fields.ts';
import { addKiln, lendKiln } from '../../../server/kilns/kiln-service.ts';
import { setKilnPicture } from '../../../server/pictures/picture-service.ts';
import type { FileStore } from '../../../server/storage/file-store.ts';
import type { Demo } from '../demo.ts';
import { drawnPicture } from '../pictures/drawn-pictures.ts';
import { actorOf, type DemoActors } from './demo-people.ts';

/** Kilns that somebody drew. */
const PICTURES: Readonly<Record<string, string>> = {
  drum: 'wind-shelter',
  ferry: 'kiln-in-wind',
  pellow: 'hill-in-frost',
  driftwood: 'driftwood-kiln',
  ropers: 'kiln-section',
  dustbin: 'floor-layers',
};

/** @returns the kilns' ids by their keys */
export async function addDemoKilns(
  db: Knex,
  store: FileStore,
  actors: DemoActors,
  demo: Demo,
): Promise<ReadonlyMap<string, number>> {
  const ids = new Map<string, number>();
  for (const { key, keeperKey, fields } of demo.kilns) {
    const keeper = actorOf(actors, keeperKey);
    const id = await addKiln(db, keeper, kilnFieldsSchema.parse(fields));
    ids.set(key, id);
    const borrowers = demo.loans
      .filter(({ kilnKey }) => kilnKey === key)
      .map(({ borrowerKey }) => actorOf(actors, borrowerKey).name);
    if (borrowers.length > 0) await lendKiln(db, keeper, id, borrowers);
    const drawing = PICTURES[key];
    if (drawing !== undefined) await setKilnPicture(db, store, keeper, id, drawnPicture(drawing));
  }
  return ids;
}
