/** The parts of a mail that a person reads. */
export interface ParsedMail {
  date: Date | null;
  to: string;
  subject: string;
  /** The plain text; '' when the mail has none. */
  text: string;
}

interface Part {
  headers: Map<string, string>;
  body: string;
}

/** Mails nest parts inside parts; ours do so once. */
const DEPTH = 5;

/** Reads a mail of our own making: headers, encoded words, and the first part that is plain text. */
export function parseMail(source: Buffer): ParsedMail {
  const mail = splitPart(source.toString('latin1'));
  const date = new Date(mail.headers.get('date') ?? '');
  return {
    date: Number.isNaN(date.getTime()) ? null : date,
    to: decodeWords(mail.headers.get('to') ?? ''),
    subject: decodeWords(mail.headers.get('subject') ?? ''),
    text: findText(mail, DEPTH) ?? '',
  };
}

/** Headers and body are parted by the first empty line; a header goes on in lines that are indented. */
function splitPart(source: string): Part {
  const lines = source.replaceAll('\r\n', '\n');
  const end = lines.indexOf('\n\n');
  const head = end === -1 ? lines : lines.slice(0, end);
  const headers = new Map<string, string>();
  for (const line of head.replaceAll(/\n[ \t]+/g, ' ').split('\n')) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return { headers, body: end === -1 ? '' : lines.slice(end + 2) };
}

function findText(part: Part, depth: number): string | null {
  const type = part.headers.get('content-type') ?? 'text/plain';
  const boundary = /boundary="?([^";]+)"?/i.exec(type)?.[1];
  if (boundary !== undefined && depth > 0) {
    const inner = `\n${part.body}`.split(`\n--${boundary}`).slice(1, -1);
    for (const source of inner) {
      const text = findText(splitPart(source.replace(/^[ \t]*\n/, '')), depth - 1);
      if (text !== null) return text;
    }
    return null;
  }
  if (!type.toLowerCase().startsWith('text/plain')) return null;
  const encoding = (part.headers.get('content-transfer-encoding') ?? '').toLowerCase();
  return decodeBody(part.body, encoding, charsetOf(type)).trimEnd();
}

function charsetOf(type: string): string {
  return /charset="?([^";]+)"?/i.exec(type)?.[1] ?? 'utf-8';
}

function decodeBody(body: string, encoding: string, charset: string): string {
  if (encoding === 'base64') return decodeBytes(Buffer.from(body, 'base64'), charset);
  if (encoding === 'quoted-printable') {
    return decodeBytes(decodeQuoted(body.replaceAll(/=[ \t]*\n/g, '')), charset);
  }
  return decodeBytes(Buffer.from(body, 'latin1'), charset);
}

function decodeQuoted(text: string): Buffer {
  const bytes = text.replaceAll(/=([0-9A-Fa-f]{2})/g, (_match, hex: string) =>
    String.fromCharCode(Number.parseInt(hex, 16)),
  );
  return Buffer.from(bytes, 'latin1');
}

/** Encoded words in headers (RFC 2047); the white space between two of them does not count. */
function decodeWords(header: string): string {
  return header
    .replaceAll(/(=\?[^?]+\?[BbQq]\?[^?]*\?=)\s+(?==\?)/g, '$1')
    .replaceAll(
      /=\?([^?]+)\?([BbQq])\?([^?]*)\?=/g,
      (_match, charset: string, encoding: string, text: string) =>
        encoding.toUpperCase() === 'B'
          ? decodeBytes(Buffer.from(text, 'base64'), charset)
          : decodeBytes(decodeQuoted(text.replaceAll('_', ' ')), charset),
    );
}

function decodeBytes(bytes: Buffer, charset: string): string {
  try {
    return new TextDecoder(charset).decode(bytes);
  } catch {
    return bytes.toString('latin1');
  }
}
