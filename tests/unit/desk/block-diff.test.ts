import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { diffBlocks } from '../../../src/desk/block-diff.ts';

describe('what differs between two stories', () => {
  it('tells what was taken out and put in, in reading order', () => {
    expect(diffBlocks(['a', 'b', 'c'], ['a', 'x', 'c', 'd'])).toEqual([
      { kind: 'same', text: 'a' },
      { kind: 'gone', text: 'b' },
      { kind: 'new', text: 'x' },
      { kind: 'same', text: 'c' },
      { kind: 'new', text: 'd' },
    ]);
  });

  it('gives back both stories whole, whatever they are', () => {
    const story = fc.array(fc.constantFrom('a', 'b', 'c', 'd', ''), { maxLength: 30 });
    fc.assert(
      fc.property(story, story, (before, after) => {
        const blocks = diffBlocks(before, after);
        const texts = (not: string) =>
          blocks.filter(({ kind }) => kind !== not).map(({ text }) => text);
        expect(texts('new')).toEqual(before);
        expect(texts('gone')).toEqual(after);
      }),
    );
  });

  it('finds nothing changed in a story that is the same', () => {
    expect(diffBlocks(['a', 'a', 'b'], ['a', 'a', 'b']).every(({ kind }) => kind === 'same')).toBe(
      true,
    );
  });

  it('tells stories too long to compare as wholly other, rather than taking minutes', () => {
    const long = Array.from({ length: 700 }, (_, index) => String(index));
    expect(diffBlocks(long, long).filter(({ kind }) => kind === 'same')).toEqual([]);
  });
});
