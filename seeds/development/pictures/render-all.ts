import { mkdir, writeFile } from 'node:fs/promises';
import { allDrawings } from './all-drawings.ts';
import { DRAWN_FOLDER, DRAWN_LIST, fingerprint, notDrawnYet } from './drawn-pictures.ts';
import { renderDrawing } from './render.ts';

/** `npx tsx seeds/development/pictures/render-all.ts` draws what was altered since it was last drawn. */
await mkdir(DRAWN_FOLDER, { recursive: true });
for (const drawing of notDrawnYet()) {
  await writeFile(`${DRAWN_FOLDER}${drawing.key}.jpg`, await renderDrawing(drawing));
}
const list = Object.fromEntries(
  allDrawings().map((drawing) => [drawing.key, fingerprint(drawing)]),
);
await writeFile(DRAWN_LIST, `${JSON.stringify(list, null, 2)}\n`);
