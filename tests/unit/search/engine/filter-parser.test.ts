import { describe, expect, it } from 'vitest';
import { createColumn, setCell } from '../../../../search/engine/columns.ts';
import { evaluateFilter } from '../../../../search/engine/filter-evaluate.ts';
import { parseFilterExpression } from '../../../../search/engine/filter-parser.ts';
import { flattenDocument } from '../../../../search/engine/flatten.ts';
import type { JsonObject } from '../../../../search/engine/json.ts';

const DOCUMENTS: JsonObject[] = [
  { kind: 'Stall', peak: 680, tags: ['a b', 'c'], note: null },
  { kind: 'sag', peak: 720, tags: [], note: '' },
  { peak: [500, 900], nested: { deep: true } },
];

function matching(expression: string): number[] {
  const columns = new Map<string, ReturnType<typeof createColumn>>();
  for (const [number, document] of DOCUMENTS.entries()) {
    for (const [name, content] of flattenDocument(document)) {
      const column = columns.get(name) ?? createColumn();
      columns.set(name, column);
      setCell(column, number, content);
    }
  }
  const everyone = new Uint8Array(DOCUMENTS.length).fill(1);
  const found = evaluateFilter(
    parseFilterExpression(expression),
    (name) => columns.get(name),
    everyone,
  );
  return [...found].flatMap((held, number) => (held ? [number] : []));
}

describe('parseFilterExpression', () => {
  it('binds NOT before AND before OR', () => {
    expect(matching('kind = sag OR kind = stall AND peak > 700')).toEqual([1]);
    expect(matching('(kind = sag OR kind = stall) AND peak > 700')).toEqual([1]);
    expect(matching('(kind = sag OR kind = stall) AND peak > 600')).toEqual([0, 1]);
    expect(matching('NOT kind = sag AND NOT kind = stall')).toEqual([2]);
  });

  it('reads quoted names and values, with escaped quotes', () => {
    expect(matching(`"tags" = 'a b'`)).toEqual([0]);
    expect(parseFilterExpression(String.raw`a = "it\"s"`)).toMatchObject({
      condition: { kind: 'compare', value: 'it"s' },
    });
  });

  it.each([
    'kind',
    'kind =',
    '= 3',
    'a = 1 b',
    'a IN b',
    'a IN [b c]',
    'a = "x',
    '(a = 1',
    'a TO',
    'a = AND',
  ])('refuses %s', (expression) => {
    expect(() => parseFilterExpression(expression)).toThrow();
  });

  it('refuses nesting that could exhaust the stack', () => {
    expect(() => parseFilterExpression(`${'('.repeat(9000)}a = 1${')'.repeat(9000)}`)).toThrow(
      /depth/,
    );
    expect(() => parseFilterExpression(`${'NOT '.repeat(9000)}a = 1`)).toThrow(/depth/);
  });
});

describe('evaluateFilter', () => {
  it('compares text without case and lists by any element', () => {
    expect(matching('kind = STALL')).toEqual([0]);
    expect(matching('tags IN [c, d]')).toEqual([0]);
    expect(matching('peak = 900')).toEqual([2]);
  });

  it('includes both ends of a range', () => {
    expect(matching('peak 680 TO 720')).toEqual([0, 1]);
    expect(matching('peak 681 TO 719')).toEqual([]);
  });

  it('counts a lacking field as different, and in a negation', () => {
    expect(matching('kind != sag')).toEqual([0, 2]);
    expect(matching('NOT kind = sag')).toEqual([0, 2]);
    expect(matching('kind NOT IN [sag]')).toEqual([0, 2]);
  });

  it('tells apart existing, null and empty', () => {
    expect(matching('note EXISTS')).toEqual([0, 1]);
    expect(matching('note IS NULL')).toEqual([0]);
    expect(matching('note IS EMPTY')).toEqual([1]);
    expect(matching('tags IS EMPTY')).toEqual([1]);
    expect(matching('tags IS NOT EMPTY')).toEqual([0, 2]);
    expect(matching('note NOT EXISTS')).toEqual([2]);
  });

  it('reaches into objects by dotted names', () => {
    expect(matching('nested.deep = true')).toEqual([2]);
    expect(matching('nested EXISTS')).toEqual([2]);
  });
});
