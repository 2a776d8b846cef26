import { readFile } from 'node:fs/promises';
import { createInterface } from 'node:readline';
import { createReadStream } from 'node:fs';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { z } from 'zod';
import type { Mark } from '#shared/firing/types.ts';
import { RECORD_LIMITS } from '#shared/record/record-limits.ts';
import { DRAWN_BECAUSE, FUELS, PROBES } from '#shared/vocabulary/kiln.ts';
import { idsOf } from '#shared/vocabulary/terms.ts';
import {
  failure,
  recordReport,
  type RecordReport,
  type ReportError,
} from '../records/record-report.ts';

/**
 * Reads firings off loggers' files, as JSON:
 *
 *     npm run --silent read-record -- FILE --target 1010 --fuel propane
 *     npm run --silent read-record -- --batch LIST.jsonl      one JSON line for each line, in order
 *
 * A line of a list: {"file", "target", "fuel"?, "lit"?, "shutOff"?, "drawnBecause"?, "unit"?, "probe"?},
 * its file absolute or from the folder the command is run in, else from the list's own. Ends with 0
 * when every file was read, 1 when one was not, 2 when the options are wrong.
 */
const minute = z.coerce.number().finite();
const requestSchema = z.object({
  file: z.string().min(1),
  target: z.coerce.number().finite().nullish(),
  unit: z.enum(['C', 'F', 'K']).nullish(),
  probe: z.enum(idsOf(PROBES)).nullish(),
  fuel: z.enum(idsOf(FUELS)).nullish(),
  lit: minute.nullish(),
  shutOff: minute.nullish(),
  drawnBecause: z.enum(idsOf(DRAWN_BECAUSE)).nullish(),
});
type Request = z.infer<typeof requestSchema>;

async function answer(request: Request, otherFolder?: string): Promise<RecordReport | ReportError> {
  const marks: Mark[] = [];
  if (request.lit != null) marks.push({ minute: request.lit, kind: 'lit' });
  if (request.shutOff != null) marks.push({ minute: request.shutOff, kind: 'shut-off' });
  const bytes = await bytesOf(request.file, otherFolder);
  if (bytes === null) return failure(`There is no file ${request.file} to be read.`);
  if (bytes.byteLength > RECORD_LIMITS.bytes) return failure('The file is larger than 10 MiB.');
  return recordReport(bytes, {
    marks,
    targetCelsius: request.target ?? null,
    fuel: request.fuel ?? null,
    drawnBecause: request.drawnBecause ?? null,
    probe: request.probe ?? null,
    unit: request.unit ?? null,
  });
}

/** npm runs commands in the project's folder; INIT_CWD is where the person stood. */
async function bytesOf(file: string, otherFolder?: string): Promise<Uint8Array | null> {
  const folders = [process.env['INIT_CWD'], process.cwd(), otherFolder];
  for (const folder of folders) {
    if (folder === undefined) continue;
    try {
      return await readFile(path.resolve(folder, file));
    } catch {
      continue;
    }
  }
  return null;
}

async function readList(list: string): Promise<boolean> {
  const found = [process.env['INIT_CWD'] ?? process.cwd(), process.cwd()].map((folder) =>
    path.resolve(folder, list),
  );
  const handle = await firstReadable(found);
  if (handle === null) {
    console.error(`There is no list ${list} to be read.`);
    return false;
  }
  let wereAllRead = true;
  const lines = createInterface({ input: createReadStream(handle), crlfDelay: Infinity });
  for await (const line of lines) {
    if (line.trim() === '') continue;
    const said = await answerLine(line, path.dirname(handle));
    if ('error' in said) wereAllRead = false;
    process.stdout.write(`${JSON.stringify(said)}\n`);
  }
  return wereAllRead;
}

async function firstReadable(files: readonly string[]): Promise<string | null> {
  for (const file of files) {
    const isThere = await readFile(file).then(
      () => true,
      () => false,
    );
    if (isThere) return file;
  }
  return null;
}

async function answerLine(line: string, folder: string): Promise<RecordReport | ReportError> {
  let json: unknown;
  try {
    json = JSON.parse(line);
  } catch {
    return failure('This line of the list is no JSON.');
  }
  const request = requestSchema.safeParse(json);
  return request.success ? answer(request.data, folder) : failure(z.prettifyError(request.error));
}

async function main(): Promise<number> {
  const { values, positionals } = parseArgs({
    allowPositionals: true,
    options: {
      batch: { type: 'string' },
      target: { type: 'string' },
      unit: { type: 'string' },
      probe: { type: 'string' },
      fuel: { type: 'string' },
      lit: { type: 'string' },
      'shut-off': { type: 'string' },
      'drawn-because': { type: 'string' },
    },
  });
  if (values.batch !== undefined) return (await readList(values.batch)) ? 0 : 1;
  const request = requestSchema.safeParse({
    ...values,
    file: positionals[0],
    shutOff: values['shut-off'],
    drawnBecause: values['drawn-because'],
  });
  if (!request.success) {
    console.error(z.prettifyError(request.error));
    return 2;
  }
  const said = await answer(request.data);
  process.stdout.write(`${JSON.stringify(said, null, 2)}\n`);
  return 'error' in said ? 1 : 0;
}

try {
  process.exitCode = await main();
} catch (error) {
  if (!(error instanceof TypeError)) throw error;
  console.error(error.message);
  process.exitCode = 2;
}
