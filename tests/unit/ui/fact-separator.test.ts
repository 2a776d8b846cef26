import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { FACT_SEPARATOR } from '../../../src/ui/fact-separator.ts';

const src = path.resolve(import.meta.dirname, '../../../src');
/** Where a dot parts what cannot wrap: titles, options of a list, a drawing's own words. */
const ONE_LINE = ['ui/usePageTitle.ts', 'write/record/ChoiceForm.tsx'];

const isComment = (line: string) => /^\s*(\*|\/\/|\/\*)/.test(line);

describe('the separator between facts', () => {
  it('hangs on the fact before it and lets the next one begin a line', () => {
    expect(FACT_SEPARATOR).toMatch(/^\u00a0·\u0020$/);
  });

  it('is the only one in rows of facts: no screen parts them so that a line may begin with it', () => {
    const loose = readdirSync(src, { recursive: true, encoding: 'utf8' })
      .filter((file) => /\.tsx?$/.test(file) && !/^(shared|workbench)\//.test(file))
      .filter((file) => !ONE_LINE.includes(file) && !/^ui\/(chart\/|RecordChart)/.test(file))
      .flatMap((file) =>
        readFileSync(path.join(src, file), 'utf8')
          .split('\n')
          .filter((line) => /(^|[^\u00a0\d]) *· |['`>] ?· ?/.test(line) && !isComment(line))
          .filter((line) => !line.includes('FACT_SEPARATOR ='))
          .map((line) => `${file}: ${line.trim()}`),
      );
    expect(loose).toEqual([]);
  });
});
