import { RecordError } from './record-error.ts';
import { RECORD_LIMITS } from './record-limits.ts';

const CHUNK = 8192;
const REPLACEMENT = 0xfffd;

/**
 * The text of a record's bytes: UTF-16 by its byte-order mark; else UTF-8, with or without one, if
 * the bytes are valid; else Latin-1, as older loggers write. The mark itself is dropped.
 * @throws RecordError over 10 MiB
 */
export function decodeRecordBytes(bytes: Uint8Array): string {
  if (bytes.length > RECORD_LIMITS.bytes) {
    throw new RecordError('The file is larger than 10 MiB, the most a record may be.');
  }
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return utf16(bytes, true);
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return utf16(bytes, false);
  const hasMark = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf;
  return utf8(bytes, hasMark ? 3 : 0, hasMark) ?? latin1(bytes);
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

function utf16(bytes: Uint8Array, isLittle: boolean): string {
  const out = textBuilder();
  for (let i = 2; i + 1 < bytes.length; i += 2) {
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
