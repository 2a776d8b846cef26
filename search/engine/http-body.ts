import type { IncomingMessage } from 'node:http';
import { EngineError } from './errors.ts';
import type { Json } from './json.ts';

const LARGE_BODY_BYTES = 100 * 1024 * 1024;
const SMALL_BODY_BYTES = 8 * 1024 * 1024;

/** Values nested deeper would exhaust the stack when they are written out again. */
const MAX_DEPTH = 200;
const [QUOTE, BACKSLASH] = [0x22, 0x5c];
const [OPEN_BRACKET, CLOSE_BRACKET, OPEN_BRACE, CLOSE_BRACE] = [0x5b, 0x5d, 0x7b, 0x7d];

async function readBytes(request: IncomingMessage, limit: number): Promise<Buffer> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of request as AsyncIterable<Buffer>) {
    size += chunk.length;
    if (size > limit) {
      throw new EngineError(
        'payload_too_large',
        `The provided payload reached the size limit. The maximum accepted payload size is ${limit} bytes.`,
      );
    }
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
}

function malformed(format: string, detail: string): EngineError {
  return new EngineError(
    'malformed_payload',
    `The ${format} payload provided is malformed. ${detail}`,
  );
}

/** Whether valid JSON nests deeper than any document or query has reason to. */
function isTooDeep(bytes: Buffer): boolean {
  let depth = 0;
  let inText = false;
  for (let at = 0; at < bytes.length; at += 1) {
    const byte = bytes[at];
    if (inText) {
      if (byte === BACKSLASH) at += 1;
      else if (byte === QUOTE) inText = false;
    } else if (byte === QUOTE) inText = true;
    else if (byte === OPEN_BRACKET || byte === OPEN_BRACE) {
      depth += 1;
      if (depth > MAX_DEPTH) return true;
    } else if (byte === CLOSE_BRACKET || byte === CLOSE_BRACE) depth -= 1;
  }
  return false;
}

function parseJson(text: string): Json {
  try {
    return JSON.parse(text) as Json;
  } catch (error) {
    throw malformed('`json`', error instanceof Error ? error.message : '');
  }
}

function parseLines(text: string): Json {
  return text
    .split('\n')
    .filter((line) => line.trim() !== '')
    .map((line) => {
      try {
        return JSON.parse(line) as Json;
      } catch (error) {
        throw malformed('`ndjson`', error instanceof Error ? error.message : '');
      }
    });
}

/** The body of a request as JSON (one value per line for NDJSON), or undefined when empty. */
export async function readBody(
  request: IncomingMessage,
  large: boolean,
): Promise<Json | undefined> {
  const bytes = await readBytes(request, large ? LARGE_BODY_BYTES : SMALL_BODY_BYTES);
  if (bytes.length === 0) return undefined;
  const accepted = large ? '`application/json`, `application/x-ndjson`' : '`application/json`';
  const header = request.headers['content-type'];
  if (header === undefined) {
    throw new EngineError(
      'missing_content_type',
      `A Content-Type header is missing. Accepted values for the Content-Type header are: ${accepted}`,
    );
  }
  const type = header.split(';')[0]?.trim().toLowerCase();
  const text = bytes.toString('utf8').replace(/^\uFEFF/, '');
  const isLines = large && type === 'application/x-ndjson';
  if (type === 'application/json' || isLines) {
    const value = isLines ? parseLines(text) : parseJson(text);
    if (isTooDeep(bytes)) throw malformed('`json`', `It nests deeper than ${MAX_DEPTH} levels.`);
    return value;
  }
  throw new EngineError(
    'invalid_content_type',
    `The Content-Type \`${header}\` is invalid. Accepted values for the Content-Type header are: ${accepted}`,
  );
}
