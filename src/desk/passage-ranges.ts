/** Where a passage stands in a text, as string offsets. */
export interface Place {
  readonly from: number;
  readonly to: number;
}

const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');

/**
 * Every place where one of the passages stands in the text. Spaces and line ends count alike, since
 * a story's markup may break a line where the passage has a space.
 */
export function placesOf(text: string, passages: readonly string[]): Place[] {
  const found: Place[] = [];
  for (const passage of new Set(passages.map((each) => each.trim()))) {
    if (passage === '') continue;
    const pattern = new RegExp(passage.split(/\s+/).map(escaped).join('\\s+'), 'g');
    for (const match of text.matchAll(pattern)) {
      found.push({ from: match.index, to: match.index + match[0].length });
    }
  }
  return found.sort((a, b) => a.from - b.from);
}

/** The passages in a part of the page, as ranges over its text nodes; nothing in it is changed. */
export function rangesIn(root: Element, passages: readonly string[]): Range[] {
  const walker = document.createTreeWalker(root, NodeFilter.SHOW_TEXT);
  const nodes: { node: Text; from: number }[] = [];
  let text = '';
  for (let node = walker.nextNode(); node; node = walker.nextNode()) {
    if (!(node instanceof Text)) continue;
    nodes.push({ node, from: text.length });
    text += node.data;
  }
  const spotOf = (at: number, isEnd: boolean): [Text, number] | null => {
    const holder = nodes.findLast(({ from }) => (isEnd ? from < at : from <= at));
    return holder ? [holder.node, at - holder.from] : null;
  };
  return placesOf(text, passages).flatMap(({ from, to }) => {
    const [start, end] = [spotOf(from, false), spotOf(to, true)];
    if (!start || !end) return [];
    const range = document.createRange();
    range.setStart(...start);
    range.setEnd(...end);
    return [range];
  });
}
