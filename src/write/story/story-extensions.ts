import { mergeAttributes, Node, ReactNodeViewRenderer } from '@tiptap/react';
import { StarterKit } from '@tiptap/starter-kit';
import { isSafeLink } from '#shared/note/story.ts';
import { PictureInStory } from './PictureInStory.tsx';
import { storySignals, type Signal } from './story-signals.ts';

export const ASIDE_WORDS = { caution: 'Caution', change: 'What I would change' } as const;
export type AsideKind = keyof typeof ASIDE_WORDS;

/** What may stand in a list's item, a quote and a set-apart block. */
const INNER = '(paragraph | bulletList | orderedList)';
const CONTENTS: Readonly<Record<string, string>> = {
  listItem: `paragraph ${INNER}*`,
  blockquote: `${INNER}+`,
};

/** The parts of a text editor that a story has, with the contents that a story allows. */
const StoryKit = StarterKit.extend({
  addExtensions() {
    return (this.parent?.() ?? []).map((extension) => {
      const content = CONTENTS[extension.name];
      return content !== undefined && extension instanceof Node
        ? extension.extend({ content })
        : extension;
    });
  },
}).configure({
  code: false,
  codeBlock: false,
  strike: false,
  underline: false,
  heading: { levels: [2, 3] },
  dropcursor: { color: 'var(--verdigris)', width: 2 },
  link: {
    openOnClick: false,
    autolink: false,
    linkOnPaste: true,
    defaultProtocol: 'https',
    isAllowedUri: (address) => isSafeLink(address),
    HTMLAttributes: { target: null, rel: 'noopener nofollow ugc' },
  },
});

/** A caution for others, or what the author would change. */
const Aside = Node.create({
  name: 'aside',
  group: 'block',
  content: `${INNER}+`,
  defining: true,
  addAttributes() {
    return {
      kind: {
        default: 'caution',
        parseHTML: (element) => (element.dataset['kind'] === 'change' ? 'change' : 'caution'),
        renderHTML: ({ kind }) => ({ 'data-kind': String(kind) }),
      },
    };
  },
  parseHTML() {
    return [{ tag: 'div[data-kind]', contentElement: '[data-content]' }];
  },
  renderHTML({ node, HTMLAttributes }) {
    const kind: AsideKind = node.attrs['kind'] === 'change' ? 'change' : 'caution';
    return [
      'div',
      mergeAttributes(HTMLAttributes, {
        class: `story-aside ${kind}`,
        role: 'note',
        'aria-label': ASIDE_WORDS[kind],
      }),
      ['p', { class: 'aside-label', contenteditable: 'false' }, ASIDE_WORDS[kind]],
      ['div', { 'data-content': '' }, 0],
    ];
  },
});

const textAttribute = (name: string) => ({
  default: '',
  parseHTML: (element: HTMLElement) => element.dataset[name] ?? '',
  renderHTML: (attributes: Record<string, unknown>) => ({ [`data-${name}`]: attributes[name] }),
});

/** A picture of the note, placed between blocks. Only names that the server gave. */
const Picture = Node.create({
  name: 'picture',
  group: 'block',
  atom: true,
  selectable: true,
  draggable: false,
  addAttributes() {
    return {
      name: textAttribute('name'),
      alt: textAttribute('alt'),
      caption: textAttribute('caption'),
    };
  },
  parseHTML() {
    return [
      {
        tag: 'figure[data-name]',
        getAttrs: (element) =>
          /^[0-9a-f]{32}$/.test(element.dataset['name'] ?? '') ? null : false,
      },
    ];
  },
  renderHTML({ HTMLAttributes }) {
    return ['figure', HTMLAttributes];
  },
  addNodeView() {
    return ReactNodeViewRenderer(PictureInStory, {
      // Fields and buttons of the picture are no business of the text around it.
      stopEvent: ({ event }) =>
        event.target instanceof Element && event.target.closest('[data-controls]') !== null,
    });
  },
});

export function storyExtensions(send: Signal) {
  return [StoryKit, Aside, Picture, storySignals(send)];
}
