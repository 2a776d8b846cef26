import sharp from 'sharp';
import { normal, seeded } from './random.ts';
import type { Drawing } from './sheet.ts';

const TILE = 256;
/** Deviation of the paper's grain, of 255. */
const GRAIN = 9;

/** A tile of paper grain: seeded noise about the middle grey, which soft light leaves as it is. */
function grain(): { data: Buffer; info: { width: number; height: number; channels: 4 } } {
  const random = seeded(1);
  const data = Buffer.alloc(TILE * TILE * 4);
  for (let i = 0; i < TILE * TILE; i += 1) {
    const tone = Math.max(0, Math.min(255, Math.round(128 + normal(random) * GRAIN)));
    data.fill(tone, i * 4, i * 4 + 3);
    data[i * 4 + 3] = 255;
  }
  return { data, info: { width: TILE, height: TILE, channels: 4 } };
}

/** JPEG bytes of a drawing, as a camera's file would be handed in. */
export async function renderDrawing(drawing: Drawing): Promise<Buffer> {
  const { data, info } = grain();
  return sharp(Buffer.from(drawing.svg), { limitInputPixels: 20_000_000 })
    .flatten({ background: '#e4e1da' })
    .composite([{ input: data, raw: info, tile: true, blend: 'soft-light' }])
    .jpeg({ quality: 78, mozjpeg: true })
    .toBuffer();
}
