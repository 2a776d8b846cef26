import sharp from 'sharp';
import { MAX_PICTURE_PIXELS, PICTURE_WIDTHS } from '#shared/api/pictures.ts';
import { AppError } from '../http/problem.ts';
import { turnstile } from '../http/turnstile.ts';
import { pictureKindOf } from './picture-kind.ts';

// The library decodes far more than we take (SVG among it): all loaders off, then three on.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({
  operation: ['VipsForeignLoadJpegBuffer', 'VipsForeignLoadPngBuffer', 'VipsForeignLoadWebpBuffer'],
});
sharp.cache(false);

const DECODE_SECONDS = 15;
const PREVIEW_WIDTH = 1200;
/** A strip of a picture would otherwise be taller than WebP can be (16,383 pixels). */
const TALLEST = 8000;
const PLACEHOLDER_SIDE = 24;
/** Two decodings at once on two cores; a queue, then 503. */
const inTurn = turnstile(2, 20);

export interface EncodedPicture {
  readonly width: number;
  readonly height: number;
  readonly widths: number[];
  /** Data URL of a tiny WebP. */
  readonly placeholder: string;
  /** File name within the picture's folder → bytes; every one a new encoding. */
  readonly files: readonly { readonly name: string; readonly bytes: Buffer }[];
}

/**
 * Makes the stored encodings of an uploaded picture: three widths in WebP and a JPEG for link
 * previews, upright, sRGB, without any metadata. Nothing of the original bytes is kept.
 *
 * @throws AppError 'bad-picture' with a sentence for the member; 'busy' when too many wait
 */
export async function encodePicture(bytes: Buffer): Promise<EncodedPicture> {
  const kind = pictureKindOf(bytes);
  if (kind === 'heic') {
    throw new AppError(
      'bad-picture',
      'This is a HEIC picture, as iPhones keep them. Share it as JPEG (Settings, Camera, Formats, Most compatible), or send yourself a copy and choose that.',
    );
  }
  if (kind === 'other') {
    throw new AppError('bad-picture', 'Only JPEG, PNG and WebP pictures are kept here.');
  }
  return inTurn(() => encode(bytes));
}

const open = (bytes: Buffer) =>
  sharp(bytes, {
    limitInputPixels: MAX_PICTURE_PIXELS,
    failOn: 'error',
    sequentialRead: true,
    animated: false,
  }).timeout({ seconds: DECODE_SECONDS });

async function encode(bytes: Buffer): Promise<EncodedPicture> {
  try {
    const header = await open(bytes).metadata();
    if (header.width * header.height > MAX_PICTURE_PIXELS) throw tooManyPixels();
    // Decoded once, upright and in sRGB; every size is made from these pixels.
    const widest = Math.max(...PICTURE_WIDTHS);
    const { data, info } = await open(bytes)
      .autoOrient()
      .toColourspace('srgb')
      .resize({ width: widest, height: TALLEST, fit: 'inside', withoutEnlargement: true })
      .raw({ depth: 'uchar' })
      .toBuffer({ resolveWithObject: true });
    const pixels = () =>
      sharp(data, { raw: { width: info.width, height: info.height, channels: info.channels } });
    const widths = [...new Set(PICTURE_WIDTHS.map((width) => Math.min(width, info.width)))];
    const sizes = await Promise.all(
      widths.map(async (width) => ({
        name: `${String(width)}.webp`,
        bytes: await pixels().resize({ width }).webp({ quality: 80, effort: 3 }).toBuffer(),
      })),
    );
    const preview = await pixels()
      .resize({ width: PREVIEW_WIDTH, withoutEnlargement: true })
      .flatten({ background: '#ffffff' })
      .jpeg({ quality: 80, mozjpeg: false })
      .toBuffer();
    const placeholder = await pixels()
      .resize({ width: PLACEHOLDER_SIDE, height: PLACEHOLDER_SIDE, fit: 'inside' })
      .webp({ quality: 30 })
      .toBuffer();
    return {
      width: info.width,
      height: info.height,
      widths,
      placeholder: `data:image/webp;base64,${placeholder.toString('base64')}`,
      files: [...sizes, { name: 'preview.jpg', bytes: preview }],
    };
  } catch (error) {
    if (error instanceof AppError) throw error;
    const message = error instanceof Error ? error.message : '';
    if (message.includes('pixel limit')) throw tooManyPixels();
    throw new AppError(
      'bad-picture',
      message.includes('timeout')
        ? 'This picture took too long to read.'
        : 'This picture is damaged and cannot be read.',
    );
  }
}

function tooManyPixels(): AppError {
  return new AppError(
    'too-large',
    'This picture has more than 40 million pixels; make it smaller first.',
  );
}
