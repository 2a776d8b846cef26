import { z } from 'zod';
import { text } from './field-types.ts';

/**
 * The story as the editor's JSON, checked against a closed list of nodes, marks and attributes
 * before anything reads it. The HTML that readers see is made from this on the server.
 */
export const MAX_STORY_NODES = 2000;
export const MAX_STORY_DEPTH = 20;
export const MAX_STORY_BYTES = 200_000;

const SAFE_LINK = /^(https?:\/\/|mailto:)[^\s\\\p{Cc}\p{Cf}]+$/iu;

/** Only http, https and mailto, without credentials, spaces, backslashes or control characters. */
export function isSafeLink(href: string): boolean {
  if (href.length > 2000 || !SAFE_LINK.test(href)) return false;
  const authority = /^https?:\/\/([^/?#]*)/i.exec(href)?.[1];
  return authority === undefined || (authority !== '' && !authority.includes('@'));
}

/** Pictures are named by the server: 32 hexadecimal digits. */
export const pictureNameSchema = z.string().regex(/^[0-9a-f]{32}$/);

const markSchema = z.discriminatedUnion('type', [
  z.strictObject({ type: z.literal('bold') }),
  z.strictObject({ type: z.literal('italic') }),
  z.strictObject({
    type: z.literal('link'),
    attrs: z.strictObject({ href: z.string().refine(isSafeLink, 'This link cannot be kept.') }),
  }),
]);

const textNode = z.strictObject({
  type: z.literal('text'),
  text: z.string().min(1).max(20_000),
  marks: z.array(markSchema).max(3).optional(),
});
const hardBreak = z.strictObject({ type: z.literal('hardBreak') });
const inline = z.array(z.discriminatedUnion('type', [textNode, hardBreak])).max(MAX_STORY_NODES);

export type StoryInline = z.output<typeof textNode> | z.output<typeof hardBreak>;
export interface StoryBlock {
  type:
    | 'paragraph'
    | 'heading'
    | 'bulletList'
    | 'orderedList'
    | 'listItem'
    | 'blockquote'
    | 'horizontalRule'
    | 'aside'
    | 'picture';
  attrs?: Record<string, string | number | null> | undefined;
  content?: (StoryBlock | StoryInline)[] | undefined;
}

export const pictureAttrsSchema = z.strictObject({
  name: pictureNameSchema,
  alt: text(500),
  caption: text(300),
});

const blocks = (of: () => z.ZodType<StoryBlock>[]) =>
  z.lazy(() => z.array(z.union(of() as [z.ZodType<StoryBlock>])).max(MAX_STORY_NODES));

const paragraph: z.ZodType<StoryBlock> = z.strictObject({
  type: z.literal('paragraph'),
  content: inline.optional(),
});
const heading: z.ZodType<StoryBlock> = z.strictObject({
  type: z.literal('heading'),
  attrs: z.strictObject({ level: z.union([z.literal(2), z.literal(3)]) }),
  content: inline.optional(),
});
const listItem: z.ZodType<StoryBlock> = z.strictObject({
  type: z.literal('listItem'),
  content: blocks(() => [paragraph, bulletList, orderedList]),
});
const bulletList: z.ZodType<StoryBlock> = z.strictObject({
  type: z.literal('bulletList'),
  content: blocks(() => [listItem]),
});
const orderedList: z.ZodType<StoryBlock> = z.strictObject({
  type: z.literal('orderedList'),
  attrs: z.strictObject({ start: z.number().int().min(0).max(1000) }).optional(),
  content: blocks(() => [listItem]),
});
const blockquote: z.ZodType<StoryBlock> = z.strictObject({
  type: z.literal('blockquote'),
  content: blocks(() => [paragraph, bulletList, orderedList]),
});
/** A set-apart block: a caution for others, or what the author would change. */
const aside: z.ZodType<StoryBlock> = z.strictObject({
  type: z.literal('aside'),
  attrs: z.strictObject({ kind: z.enum(['caution', 'change']) }),
  content: blocks(() => [paragraph, bulletList, orderedList]),
});
const picture: z.ZodType<StoryBlock> = z.strictObject({
  type: z.literal('picture'),
  attrs: pictureAttrsSchema,
});
const horizontalRule: z.ZodType<StoryBlock> = z.strictObject({ type: z.literal('horizontalRule') });

/** Depth and node count by a plain walk, before the recursive schema sees the value. */
function withinBounds(value: unknown): boolean {
  const stack: { node: unknown; depth: number }[] = [{ node: value, depth: 0 }];
  let nodes = 0;
  for (let next = stack.pop(); next; next = stack.pop()) {
    if (typeof next.node !== 'object' || next.node === null) continue;
    nodes += 1;
    if (nodes > MAX_STORY_NODES * 4 || next.depth > MAX_STORY_DEPTH * 3) return false;
    for (const child of Object.values(next.node))
      stack.push({ node: child, depth: next.depth + 1 });
  }
  return true;
}

export interface Story {
  type: 'doc';
  content: StoryBlock[];
}

export const storySchema: z.ZodType<Story> = z
  .custom<unknown>((value) => withinBounds(value), 'This story is too long or nested too deeply.')
  .pipe(
    z.strictObject({
      type: z.literal('doc'),
      content: blocks(() => [
        paragraph,
        heading,
        bulletList,
        orderedList,
        blockquote,
        aside,
        picture,
        horizontalRule,
      ]),
    }),
  );

export const EMPTY_STORY: Story = { type: 'doc', content: [{ type: 'paragraph' }] };

/** The names of the pictures placed in a story, in order, each once. */
export function picturesIn(story: Story): string[] {
  const names = new Set<string>();
  const visit = (block: StoryBlock | StoryInline): void => {
    if (block.type === 'picture' && 'attrs' in block && typeof block.attrs?.['name'] === 'string') {
      names.add(block.attrs['name']);
    }
    if ('content' in block) block.content?.forEach(visit);
  };
  story.content.forEach(visit);
  return [...names];
}

export interface StoryText {
  /** Which kind of block the words stand in: cautions do not count as unsafe practice. */
  readonly kind: 'heading' | 'text' | 'quote' | 'caution' | 'change' | 'caption';
  readonly text: string;
}

/** The story's words by block, for search and for the reading of unsafe practice. */
export function storyTexts(story: Story): StoryText[] {
  const out: StoryText[] = [];
  const words = (content: StoryBlock['content']): string =>
    (content ?? [])
      .map((child) => (child.type === 'text' ? child.text : child.type === 'hardBreak' ? '\n' : ''))
      .join('');
  const visit = (block: StoryBlock, within: StoryText['kind']): void => {
    if (block.type === 'picture') {
      const parts = [block.attrs?.['caption'], block.attrs?.['alt']];
      for (const part of parts) {
        if (typeof part === 'string' && part) out.push({ kind: 'caption', text: part });
      }
      return;
    }
    const kind =
      block.type === 'aside'
        ? block.attrs?.['kind'] === 'caution'
          ? 'caution'
          : 'change'
        : block.type === 'blockquote'
          ? 'quote'
          : block.type === 'heading'
            ? 'heading'
            : within;
    const own = words(block.content).trim();
    if (own) out.push({ kind, text: own });
    for (const child of block.content ?? []) {
      if (child.type !== 'text' && child.type !== 'hardBreak') visit(child, kind);
    }
  };
  story.content.forEach((block) => {
    visit(block, 'text');
  });
  return out;
}
