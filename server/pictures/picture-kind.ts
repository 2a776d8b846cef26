/** What the first bytes say a file is. Names and types given by clients are not looked at. */
export type PictureKind = 'jpeg' | 'png' | 'webp' | 'heic' | 'other';

const startsWith = (bytes: Uint8Array, at: number, text: string): boolean =>
  [...text].every((character, index) => bytes[at + index] === character.charCodeAt(0));

const HEIC_BRANDS = ['heic', 'heix', 'heim', 'heis', 'hevc', 'mif1', 'msf1'];

/** Decides from the content before any decoder sees it: SVG, GIF, TIFF, AVIF and PDF are `other`. */
export function pictureKindOf(bytes: Uint8Array): PictureKind {
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return 'jpeg';
  if (bytes[0] === 0x89 && startsWith(bytes, 1, 'PNG\r\n') && bytes[6] === 0x1a) return 'png';
  if (startsWith(bytes, 0, 'RIFF') && startsWith(bytes, 8, 'WEBP')) return 'webp';
  if (startsWith(bytes, 4, 'ftyp') && HEIC_BRANDS.some((brand) => startsWith(bytes, 8, brand))) {
    return 'heic';
  }
  return 'other';
}
