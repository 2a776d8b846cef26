import sharp from 'sharp';
import type { Drawing } from './sheet.ts';

/** JPEG bytes of a drawing, as a camera's file would be handed in. */
export async function renderDrawing(drawing: Drawing): Promise<Buffer> {
  return sharp(Buffer.from(drawing.svg), { limitInputPixels: 20_000_000 })
    .flatten({ background: '#e4e1da' })
    .jpeg({ quality: 86, mozjpeg: true })
    .toBuffer();
}
