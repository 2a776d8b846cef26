import { RecordError } from './record-error.ts';
import { RECORD_LIMITS } from './record-limits.ts';

const CHUNK = 8192;
const REPLACEMENT = 0xfffd;
const SPREADSHEET = 'This is a spreadsheet’s own file. Save the table as CSV and choose that.';

/** A record's text, and what was taken for granted to get it. */
export interface DecodedRecord {
  readonly text: string;
  readonly assumed: readonly string[];
}

/** The text of a record's bytes; see `decodeRecord`. */
export function decodeRecordBytes(bytes: Uint8Array): string {
  return decodeRecord(bytes).text;
}

/**
 * The text of a record's bytes: UTF-16 by its byte-order mark or by its empty halves; else UTF-8, with
 * or without a mark, if the bytes are valid; else Latin-1, as older loggers write. The mark is dropped.
 * @throws RecordError over 10 MiB, and for files that are no text
 */
export function decodeRecord(bytes: Uint8Array): DecodedRecord {
  if (bytes.length > RECORD_LIMITS.bytes) {
    throw new RecordError('The file is larger than 10 MiB, the most a record may be.');
  }
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return { text: utf16(bytes, 2, true), assumed: [] };
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return { text: utf16(bytes, 2, false), assumed: [] };
  refuseForeign(bytes);
  const halves = emptyHalves(bytes);
  if (halves !== null) {
    return {
      text: utf16(bytes, 0, halves === 'second'),
      assumed: ['The file is read as UTF-16, though it does not say so.'],
    };
  }
  const hasMark = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf;
  const text = utf8(bytes, hasMark ? 3 : 0, hasMark);
  return text === null
    ? { text: latin1(bytes), assumed: ['The file is no UTF-8; its letters are read as Latin-1.'] }
    : { text, assumed: [] };
}

/** First bytes of files that people choose instead of the table in them. */
const FOREIGN: readonly { readonly bytes: readonly number[]; readonly words: string }[] = [
  { bytes: [0x50, 0x4b, 3, 4], words: SPREADSHEET },
  { bytes: [0xd0, 0xcf, 0x11, 0xe0], words: SPREADSHEET },
  {
    bytes: [0x25, 0x50, 0x44, 0x46],
    words: 'This is a PDF, no table of text. Save the table as CSV and choose that.',
  },
  { bytes: [0x1f, 0x8b], words: 'This file is packed. Unpack it and choose the table in it.' },
  { bytes: [0x89, 0x50, 0x4e, 0x47], words: 'This is a picture, no table of text.' },
  { bytes: [0xff, 0xd8, 0xff], words: 'This is a picture, no table of text.' },
];

function refuseForeign(bytes: Uint8Array): void {
  for (const foreign of FOREIGN) {
    if (foreign.bytes.every((byte, i) => bytes[i] === byte)) throw new RecordError(foreign.words);
  }
}

/** How much of a file is looked at for empty halves. */
const HALVES_LOOKED_AT = 1024;

/** Which half of most pairs of bytes is zero, as in UTF-16 of plain letters without its mark. */
function emptyHalves(bytes: Uint8Array): 'first' | 'second' | null {
  const pairs = Math.floor(Math.min(bytes.length, HALVES_LOOKED_AT) / 2);
  let first = 0;
  let second = 0;
  for (let i = 0; i < 2 * pairs; i += 2) {
    if (bytes[i] === 0) first += 1;
    if (bytes[i + 1] === 0) second += 1;
  }
  if (pairs < 4 || first + second === 0) return null;
  if (second > 0.8 * pairs && first === 0) return 'second';
  return first > 0.8 * pairs && second === 0 ? 'first' : null;
}

/** Collects code units and turns them into text a chunk at a time. */
function textBuilder(): { push: (unit: number) => void; text: () => string } {
  const parts: string[] = [];
  let units: number[] = [];
  const flush = () => {
    parts.push(String.fromCharCode(...units));
    units = [];
  };
  return {
    push(unit) {
      units.push(unit);
      if (units.length >= CHUNK) flush();
    },
    text() {
      flush();
      return parts.join('');
    },
  };
}

function utf16(bytes: Uint8Array, from: number, isLittle: boolean): string {
  const out = textBuilder();
  for (let i = from; i + 1 < bytes.length; i += 2) {
    const first = bytes[i] ?? 0;
    const second = bytes[i + 1] ?? 0;
    out.push(isLittle ? first | (second << 8) : (first << 8) | second);
  }
  return out.text();
}

function latin1(bytes: Uint8Array): string {
  const out = textBuilder();
  for (const byte of bytes) out.push(byte);
  return out.text();
}

/** UTF-8 by RFC 3629; null for invalid bytes, unless a mark said that it is UTF-8. */
function utf8(bytes: Uint8Array, from: number, isMarked: boolean): string | null {
  const out = textBuilder();
  for (let i = from; i < bytes.length;) {
    const lead = bytes[i] ?? 0;
    if (lead < 0x80) {
      out.push(lead);
      i += 1;
      continue;
    }
    const length = lead >= 0xf0 ? 4 : lead >= 0xe0 ? 3 : 2;
    const code = codePoint(bytes, i, lead, length);
    if (code === null) {
      if (!isMarked) return null;
      out.push(REPLACEMENT);
      i += 1;
      continue;
    }
    if (code >= 0x10000) {
      out.push(0xd800 + ((code - 0x10000) >> 10));
      out.push(0xdc00 + ((code - 0x10000) & 0x3ff));
    } else {
      out.push(code);
    }
    i += length;
  }
  return out.text();
}

const LEAST_CODE = [0, 0, 0x80, 0x800, 0x10000];

function codePoint(bytes: Uint8Array, at: number, lead: number, length: number): number | null {
  if (lead < 0xc2 || lead > 0xf4 || at + length > bytes.length) return null;
  let code = lead & (0xff >> (length + 1));
  for (let i = 1; i < length; i += 1) {
    const next = bytes[at + i] ?? 0;
    if ((next & 0xc0) !== 0x80) return null;
    code = (code << 6) | (next & 0x3f);
  }
  const isSurrogate = code >= 0xd800 && code <= 0xdfff;
  return code < (LEAST_CODE[length] ?? 0) || code > 0x10ffff || isSurrogate ? null : code;
}
