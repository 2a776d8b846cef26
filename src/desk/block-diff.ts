/** One paragraph, heading or list item of a story, and whether it is there before, after or both. */
export interface DiffBlock {
  readonly kind: 'same' | 'gone' | 'new';
  readonly text: string;
}

/** Past this many blocks a comparison block by block would take long; they are told as all new. */
const MOST_BLOCKS = 600;

/** What differs between two lists of blocks, in reading order (longest common subsequence). */
export function diffBlocks(before: readonly string[], after: readonly string[]): DiffBlock[] {
  const rows = before.length;
  const columns = after.length;
  if (rows > MOST_BLOCKS || columns > MOST_BLOCKS) {
    return [
      ...before.map((text): DiffBlock => ({ kind: 'gone', text })),
      ...after.map((text): DiffBlock => ({ kind: 'new', text })),
    ];
  }
  const width = columns + 1;
  const common = new Uint16Array((rows + 1) * width);
  const at = (row: number, column: number): number => common[row * width + column] ?? 0;
  for (let row = rows - 1; row >= 0; row -= 1) {
    for (let column = columns - 1; column >= 0; column -= 1) {
      common[row * width + column] =
        before[row] === after[column]
          ? at(row + 1, column + 1) + 1
          : Math.max(at(row + 1, column), at(row, column + 1));
    }
  }
  const blocks: DiffBlock[] = [];
  let row = 0;
  let column = 0;
  while (row < rows || column < columns) {
    const [old, now] = [before[row], after[column]];
    if (old !== undefined && old === now) {
      blocks.push({ kind: 'same', text: old });
      row += 1;
      column += 1;
    } else if (
      old !== undefined &&
      (column >= columns || at(row + 1, column) >= at(row, column + 1))
    ) {
      blocks.push({ kind: 'gone', text: old });
      row += 1;
    } else if (now !== undefined) {
      blocks.push({ kind: 'new', text: now });
      column += 1;
    }
  }
  return blocks;
}

const BLOCKS = 'p, h2, h3, h4, li, blockquote, figcaption';

/** The texts of a story's blocks. The markup is parsed, never shown, and runs nothing. */
export function storyBlocks(html: string): string[] {
  const parsed = new DOMParser().parseFromString(html, 'text/html');
  return [...parsed.querySelectorAll(BLOCKS)]
    .filter((block) => block.querySelector(BLOCKS) === null)
    .map((block) => (block.textContent ?? '').replace(/\s+/g, ' ').trim())
    .filter((text) => text !== '');
}
