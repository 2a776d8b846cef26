import { z } from 'zod';
import { pictureNameSchema } from '../note/story.ts';

/** Widths of the stored WebP sizes, px; smaller originals are not enlarged. */
export const PICTURE_WIDTHS = [480, 960, 1920] as const;
export const MAX_PICTURES = 20;
export const MAX_PICTURE_PIXELS = 40_000_000;
/** For the file chooser: an iPhone then hands over a JPEG instead of HEIC. */
export const PICTURE_ACCEPT = 'image/jpeg,image/png,image/webp';

export const pictureSchema = z.object({
  name: pictureNameSchema,
  width: z.number(),
  height: z.number(),
  /** Widths that exist, ascending. */
  widths: z.array(z.number()),
  /** A tiny data URL (WebP) shown blurred until the picture is there. */
  placeholder: z.string(),
});
export type Picture = z.infer<typeof pictureSchema>;
export const pictureListSchema = z.object({ pictures: z.array(pictureSchema) });

/** `/media/pictures/<name>/<width>.webp`. */
export function pictureUrl(name: string, width: number): string {
  return `/media/pictures/${name}/${String(width)}.webp`;
}
/** The JPEG for link previews. */
export function picturePreviewUrl(name: string): string {
  return `/media/pictures/${name}/preview.jpg`;
}
