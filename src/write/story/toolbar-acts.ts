import type { Editor } from '@tiptap/react';
import { ASIDE_WORDS, type AsideKind } from './story-extensions.ts';

/** One button of the toolbar. */
export interface ToolbarAct {
  readonly id: string;
  readonly words: string;
  /** Keys, as they are shown: `Mod` is Ctrl or ⌘. */
  readonly keys?: string;
  readonly run: (editor: Editor) => void;
  /** Whether it holds at the cursor; absent for what is no state. */
  readonly isOn?: (editor: Editor) => boolean;
  /** Whether it would do anything here. */
  readonly can?: (editor: Editor) => boolean;
}

/** Sets the blocks at the cursor apart, or back; from one kind to the other in one step. */
function toggleAside(editor: Editor, kind: AsideKind): void {
  const chain = editor.chain().focus();
  if (editor.isActive('aside', { kind })) chain.lift('aside').run();
  else if (editor.isActive('aside')) chain.updateAttributes('aside', { kind }).run();
  // A heading cannot stand in a set-apart block: its words become a paragraph of it.
  else if (editor.isActive('heading')) chain.setParagraph().wrapIn('aside', { kind }).run();
  else chain.wrapIn('aside', { kind }).run();
}

const asideAct = (kind: AsideKind): ToolbarAct => ({
  id: `aside-${kind}`,
  words: ASIDE_WORDS[kind],
  run: (editor) => toggleAside(editor, kind),
  isOn: (editor) => editor.isActive('aside', { kind }),
  can: (editor) =>
    editor.isActive('aside') || editor.isActive('heading') || editor.can().wrapIn('aside'),
});

export const TOOLBAR_GROUPS: readonly (readonly ToolbarAct[])[] = [
  [
    {
      id: 'bold',
      words: 'Bold',
      keys: 'Mod+B',
      run: (editor) => editor.chain().focus().toggleBold().run(),
      isOn: (editor) => editor.isActive('bold'),
    },
    {
      id: 'italic',
      words: 'Italic',
      keys: 'Mod+I',
      run: (editor) => editor.chain().focus().toggleItalic().run(),
      isOn: (editor) => editor.isActive('italic'),
    },
  ],
  [
    {
      id: 'heading',
      words: 'Heading',
      keys: 'Mod+Alt+2',
      run: (editor) => editor.chain().focus().toggleHeading({ level: 2 }).run(),
      isOn: (editor) => editor.isActive('heading', { level: 2 }),
      can: (editor) => editor.can().toggleHeading({ level: 2 }),
    },
    {
      id: 'subheading',
      words: 'Subheading',
      keys: 'Mod+Alt+3',
      run: (editor) => editor.chain().focus().toggleHeading({ level: 3 }).run(),
      isOn: (editor) => editor.isActive('heading', { level: 3 }),
      can: (editor) => editor.can().toggleHeading({ level: 3 }),
    },
    {
      id: 'bullets',
      words: 'List',
      keys: 'Mod+Shift+8',
      run: (editor) => editor.chain().focus().toggleBulletList().run(),
      isOn: (editor) => editor.isActive('bulletList'),
      can: (editor) => editor.can().toggleBulletList(),
    },
    {
      id: 'numbers',
      words: 'Numbered',
      keys: 'Mod+Shift+7',
      run: (editor) => editor.chain().focus().toggleOrderedList().run(),
      isOn: (editor) => editor.isActive('orderedList'),
      can: (editor) => editor.can().toggleOrderedList(),
    },
    {
      id: 'quote',
      words: 'Quote',
      keys: 'Mod+Shift+B',
      run: (editor) => editor.chain().focus().toggleBlockquote().run(),
      isOn: (editor) => editor.isActive('blockquote'),
      can: (editor) => editor.can().toggleBlockquote(),
    },
    {
      id: 'rule',
      words: 'Rule',
      run: (editor) => editor.chain().focus().setHorizontalRule().run(),
      can: (editor) => editor.can().setHorizontalRule(),
    },
  ],
  [asideAct('caution'), asideAct('change')],
];

export const HISTORY_ACTS: readonly ToolbarAct[] = [
  {
    id: 'undo',
    words: 'Undo',
    keys: 'Mod+Z',
    run: (editor) => editor.chain().focus().undo().run(),
    can: (editor) => editor.can().undo(),
  },
  {
    id: 'redo',
    words: 'Redo',
    keys: 'Mod+Shift+Z',
    run: (editor) => editor.chain().focus().redo().run(),
    can: (editor) => editor.can().redo(),
  },
];
