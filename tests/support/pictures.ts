import { readdir } from 'node:fs/promises';
import { crc32, deflateSync } from 'node:zlib';
import sharp from 'sharp';
import { pictureSchema, type Picture } from '#shared/api/pictures.ts';
import type { Api, ApiAnswer, Client } from './api.ts';

/** A JPEG of one colour, or whatever is made of it. */
export const plainPicture = (width = 64, height = 48, background = '#b5522a') =>
  sharp({ create: { width, height, channels: 3, background } });

/** Sends a picture as a browser's form does. */
export function uploadPicture(
  client: Client,
  noteId: number,
  bytes: Uint8Array,
  fileName = 'photo.jpg',
  type = 'image/jpeg',
): Promise<ApiAnswer> {
  const form = new FormData();
  form.set('file', new Blob([new Uint8Array(bytes)], { type }), fileName);
  return client.post(`/api/notes/${String(noteId)}/pictures`, undefined, { rawBody: form });
}

function chunk(type: string, data: Uint8Array): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const size = Buffer.alloc(4);
  size.writeUInt32BE(data.length);
  const check = Buffer.alloc(4);
  check.writeUInt32BE(crc32(body));
  return Buffer.concat([size, body, check]);
}

/** A PNG of one colour whose header says it is this large; `extra` chunks go before its data. */
export function pngClaiming(
  width: number,
  height: number,
  options: { rows?: number; extra?: readonly [string, Uint8Array][] } = {},
): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header.set([8, 0, 0, 0, 0], 8);
  const row = Buffer.alloc(width + 1);
  const rows = Buffer.concat(Array.from({ length: options.rows ?? 1 }, () => row));
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', header),
    ...(options.extra ?? []).map(([type, data]) => chunk(type, data)),
    chunk('IDAT', deflateSync(rows)),
    chunk('IEND', new Uint8Array()),
  ]);
}

/** Every file below the upload folder. */
export async function storedFiles(api: Api): Promise<string[]> {
  const all = await readdir(api.deps.config.uploadsFolder, { recursive: true });
  return all.filter((name) => /\.\w+$/.test(name)).sort();
}

/** Uploads a picture that is taken. */
export async function keptPicture(
  author: Client,
  noteId: number,
  image: Uint8Array,
): Promise<Picture> {
  const answer = await uploadPicture(author, noteId, image);
  if (answer.status !== 201) throw new Error(answer.text);
  return answer.as(pictureSchema);
}

/** One size as its author gets it. */
export async function fetchedSize(api: Api, author: Client, picture: Picture, file: string) {
  const url = `${api.baseUrl}/media/pictures/${picture.name}/${file}`;
  const cookies = [...author.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  const response = await fetch(url, { headers: { Cookie: cookies } });
  if (response.status !== 200) throw new Error(`${file}: ${String(response.status)}`);
  return Buffer.from(await response.arrayBuffer());
}

/** Every stored encoding of a picture, as its author gets it. */
export async function allSizes(api: Api, author: Client, picture: Picture): Promise<Buffer[]> {
  const files = [...picture.widths.map((width) => `${String(width)}.webp`), 'preview.jpg'];
  return Promise.all(files.map((file) => fetchedSize(api, author, picture, file)));
}
