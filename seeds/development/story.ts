import { createHash } from 'node:crypto';
import type { Story, StoryBlock, StoryInline } from '#shared/note/story.ts';

/**
 * Small builders for stories as the editor's JSON. In text, `*word*` is italic and `**word**` bold.
 */

/** Until a picture is stored it is known by a name made from its key; the loader replaces it. */
export function pictureName(key: string): string {
  return createHash('md5').update(`demo picture ${key}`).digest('hex');
}

function inline(text: string): StoryInline[] {
  return text
    .split(/(\*\*[^*]+\*\*|\*[^*]+\*)/)
    .filter((part) => part !== '')
    .map((part): StoryInline => {
      if (part.startsWith('**'))
        return { type: 'text', text: part.slice(2, -2), marks: [{ type: 'bold' }] };
      if (part.startsWith('*'))
        return { type: 'text', text: part.slice(1, -1), marks: [{ type: 'italic' }] };
      return { type: 'text', text: part };
    });
}

export const p = (text: string): StoryBlock => ({ type: 'paragraph', content: inline(text) });
export const h2 = (text: string): StoryBlock => ({
  type: 'heading',
  attrs: { level: 2 },
  content: inline(text),
});
const items = (texts: readonly string[]): StoryBlock[] =>
  texts.map((text) => ({ type: 'listItem', content: [p(text)] }));
export const list = (...texts: string[]): StoryBlock => ({
  type: 'bulletList',
  content: items(texts),
});
export const steps = (...texts: string[]): StoryBlock => ({
  type: 'orderedList',
  attrs: { start: 1 },
  content: items(texts),
});
export const quote = (text: string): StoryBlock => ({ type: 'blockquote', content: [p(text)] });
export const rule = (): StoryBlock => ({ type: 'horizontalRule' });
export const caution = (...texts: string[]): StoryBlock => ({
  type: 'aside',
  attrs: { kind: 'caution' },
  content: texts.map(p),
});
/** "What I would change". */
export const change = (...texts: string[]): StoryBlock => ({
  type: 'aside',
  attrs: { kind: 'change' },
  content: texts.map(p),
});
export const picture = (key: string, alt: string, caption: string): StoryBlock => ({
  type: 'picture',
  attrs: { name: pictureName(key), alt, caption },
});

export const story = (...blocks: StoryBlock[]): Story => ({ type: 'doc', content: blocks });
