import {
  isSafeLink,
  pictureNameSchema,
  type Story,
  type StoryBlock,
  type StoryInline,
} from '#shared/note/story.ts';

/** A node as an editor gives it: anything may be missing, and more may be there. */
export interface EditorNode {
  readonly type?: string | undefined;
  readonly attrs?: Readonly<Record<string, unknown>> | undefined;
  readonly content?: readonly EditorNode[] | undefined;
  readonly marks?:
    | readonly {
        readonly type: string;
        readonly attrs?: Readonly<Record<string, unknown>> | undefined;
      }[]
    | undefined;
  readonly text?: string | undefined;
}

/** What one text node may hold; longer runs are kept as several. */
const TEXT_CHARACTERS = 20_000;
const FARTHEST_START = 1000;
export const ALT_CHARACTERS = 500;
export const CAPTION_CHARACTERS = 300;

const INNER: readonly string[] = ['paragraph', 'bulletList', 'orderedList'];
const TOP: readonly string[] = [
  ...INNER,
  'heading',
  'blockquote',
  'aside',
  'picture',
  'horizontalRule',
];

/**
 * The editor's document as a story: only the nodes, marks and attributes that a story has, so that
 * whatever was pasted or is added by an extension, the result can be kept. Empty paragraphs at the
 * end, where the editor keeps one for writing on, are no part of the story.
 */
export function toStory(doc: EditorNode): Story {
  const content = blocksOf(doc.content ?? [], TOP);
  while (content.length > 1 && isEmptyParagraph(content[content.length - 1])) content.pop();
  return { type: 'doc', content: content.length > 0 ? content : [{ type: 'paragraph' }] };
}

/**
 * A story as the editor can take it: lists, quotes and set-apart blocks have something in them, and
 * a list's item begins with a paragraph, because the editor has no place for the cursor otherwise.
 */
export function fromStory(story: Story): EditorNode {
  return toStory(story);
}

const isEmptyParagraph = (block: StoryBlock | undefined): boolean =>
  block?.type === 'paragraph' && block.content === undefined;

function blocksOf(nodes: readonly EditorNode[], allowed: readonly string[]): StoryBlock[] {
  return nodes.flatMap((node) => {
    const block = blockOf(node, allowed);
    if (block) return [block];
    // What cannot stand here leaves its content behind rather than take it along.
    return node.content && !isInlineOnly(node)
      ? blocksOf(node.content, allowed)
      : paragraphOf(node);
  });
}

const isInlineOnly = (node: EditorNode): boolean =>
  (node.content ?? []).every(({ type }) => type === 'text' || type === 'hardBreak');

function paragraphOf(node: EditorNode): StoryBlock[] {
  const content = inlineOf(node.type === 'text' ? [node] : (node.content ?? []));
  return content.length > 0 ? [{ type: 'paragraph', content }] : [];
}

function blockOf(node: EditorNode, allowed: readonly string[]): StoryBlock | null {
  if (node.type === undefined || !allowed.includes(node.type)) return null;
  switch (node.type) {
    case 'paragraph': {
      const content = inlineOf(node.content ?? []);
      return content.length > 0 ? { type: 'paragraph', content } : { type: 'paragraph' };
    }
    case 'heading': {
      const attrs = { level: node.attrs?.['level'] === 3 ? 3 : 2 };
      const content = inlineOf(node.content ?? []);
      return content.length > 0 ? { type: 'heading', attrs, content } : { type: 'heading', attrs };
    }
    case 'bulletList':
    case 'orderedList':
      return listOf(node);
    case 'blockquote':
      return { type: 'blockquote', content: filled(blocksOf(node.content ?? [], INNER)) };
    case 'aside':
      return {
        type: 'aside',
        attrs: { kind: node.attrs?.['kind'] === 'change' ? 'change' : 'caution' },
        content: filled(blocksOf(node.content ?? [], INNER)),
      };
    case 'picture':
      return pictureOf(node);
    case 'horizontalRule':
      return { type: 'horizontalRule' };
    default:
      return null;
  }
}

const filled = (blocks: StoryBlock[]): StoryBlock[] =>
  blocks.length > 0 ? blocks : [{ type: 'paragraph' }];

function listOf(node: EditorNode): StoryBlock | null {
  const items = (node.content ?? []).map((item): StoryBlock => {
    const content = blocksOf(item.type === 'listItem' ? (item.content ?? []) : [item], INNER);
    const first = content[0];
    return {
      type: 'listItem',
      content: first?.type === 'paragraph' ? content : [{ type: 'paragraph' }, ...content],
    };
  });
  if (items.length === 0) return null;
  if (node.type === 'bulletList') return { type: 'bulletList', content: items };
  const start = node.attrs?.['start'];
  const fits =
    typeof start === 'number' && Number.isInteger(start) && start >= 0 && start <= FARTHEST_START;
  return fits && start !== 1
    ? { type: 'orderedList', attrs: { start }, content: items }
    : { type: 'orderedList', content: items };
}

function pictureOf(node: EditorNode): StoryBlock | null {
  const name = pictureNameSchema.safeParse(node.attrs?.['name']);
  if (!name.success) return null;
  return {
    type: 'picture',
    attrs: {
      name: name.data,
      alt: plainText(node.attrs?.['alt'], ALT_CHARACTERS),
      caption: plainText(node.attrs?.['caption'], CAPTION_CHARACTERS),
    },
  };
}

/** One line of text that can be kept: no control characters, no half characters, not too long. */
function plainText(value: unknown, most: number): string {
  if (typeof value !== 'string') return '';
  const kept = [...value.normalize('NFC')].filter(
    (character) => !/[\p{Cc}\p{Cs}]/u.test(character),
  );
  return kept.slice(0, most).join('');
}

function inlineOf(nodes: readonly EditorNode[]): StoryInline[] {
  return nodes.flatMap((node): StoryInline[] => {
    if (node.type === 'hardBreak') return [{ type: 'hardBreak' }];
    if (node.type !== 'text' || !node.text) return inlineOf(node.content ?? []);
    const marks = marksOf(node.marks ?? []);
    return chunks(node.text).map((text) =>
      marks.length > 0 ? { type: 'text', text, marks } : { type: 'text', text },
    );
  });
}

type StoryMark = NonNullable<Extract<StoryInline, { type: 'text' }>['marks']>[number];

function marksOf(marks: NonNullable<EditorNode['marks']>): StoryMark[] {
  const kept = new Map<string, StoryMark>();
  for (const { type, attrs } of marks) {
    if (type === 'bold' || type === 'italic') kept.set(type, { type });
    const href = attrs?.['href'];
    if (type === 'link' && typeof href === 'string' && isSafeLink(href)) {
      kept.set(type, { type, attrs: { href } });
    }
  }
  return [...kept.values()];
}

/** A long run in pieces, never cut through the middle of a character. */
function chunks(text: string): string[] {
  const out: string[] = [];
  for (let at = 0; at < text.length;) {
    let end = Math.min(text.length, at + TEXT_CHARACTERS);
    const code = text.charCodeAt(end - 1);
    if (end < text.length && code >= 0xd800 && code <= 0xdbff) end -= 1;
    out.push(text.slice(at, end));
    at = end;
  }
  return out;
}
