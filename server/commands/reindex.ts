import { readConfig } from '../config.ts';
import { openDatabase } from '../database/open-database.ts';
import { createLog } from '../log.ts';
import { rebuildFigures } from '../figures/catch-up-figures.ts';
import { rebuildClimbs } from '../look-alikes/catch-up-climbs.ts';
import { reindex } from '../search/reindex.ts';
import { withLocalSettings } from '../start/local-settings.ts';
import { diskStore } from '../storage/file-store.ts';
import { runCommand, say } from './run-command.ts';

/**
 * `npm run reindex` rebuilds what is made from the notes: the search index, without a gap in
 * searching, the climbs that look-alikes are found by, and the numbers that figures are drawn from.
 */
await runCommand(async () => {
  const config = readConfig(withLocalSettings(process.env));
  const db = openDatabase(config.databaseUrl);
  try {
    const store = diskStore(config.uploadsFolder);
    const indexed = await reindex({ config, db, log: createLog(config), store }, (done, of) => {
      say(`${String(done)} of ${String(of)} notes`);
    });
    say(`The index holds ${String(indexed)} notes.`);
    const climbs = await rebuildClimbs(db);
    say(`The climbs of ${String(climbs)} notes are read anew, for look-alikes.`);
    const figures = await rebuildFigures(db);
    say(`The numbers of ${String(figures)} notes are read anew, for figures.`);
  } finally {
    await db.destroy();
  }
});
