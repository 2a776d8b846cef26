import type { Editor } from '@tiptap/react';
import { useEffect, useReducer, useRef, useState, type KeyboardEvent } from 'react';
import { HISTORY_ACTS, TOOLBAR_GROUPS, type ToolbarAct } from './toolbar-acts.ts';

interface Props {
  readonly editor: Editor;
  readonly onLink: () => void;
  readonly onPictures: () => void;
  /** Id of what it works on. */
  readonly controls: string;
}

const isMac = /Mac|iPhone|iPad/.test(navigator.userAgent);
const keyWords = (keys: string): string =>
  keys.replace('Mod', isMac ? '⌘' : 'Ctrl').replace('Alt', isMac ? '⌥' : 'Alt');

/** The tools of the story: one tab stop, arrows from one to the next. */
export function StoryToolbar({ editor, onLink, onPictures, controls }: Props) {
  const groups: readonly (readonly ToolbarAct[])[] = [
    ...TOOLBAR_GROUPS,
    [
      {
        id: 'link',
        words: 'Link',
        keys: 'Mod+K',
        run: onLink,
        isOn: (one) => one.isActive('link'),
      },
      { id: 'pictures', words: 'Pictures', run: onPictures },
    ],
    HISTORY_ACTS,
  ];
  const acts = groups.flat();
  // What holds at the cursor is asked anew whenever the editor has changed.
  const [, lookAgain] = useReducer((times: number) => times + 1, 0);
  useEffect(() => {
    editor.on('create', lookAgain);
    editor.on('transaction', lookAgain);
    return () => {
      editor.off('create', lookAgain);
      editor.off('transaction', lookAgain);
    };
  }, [editor]);
  const [current, setCurrent] = useState(0);
  const bar = useRef<HTMLDivElement>(null);

  const move = (event: KeyboardEvent): void => {
    const to =
      event.key === 'ArrowRight' || event.key === 'ArrowDown'
        ? (current + 1) % acts.length
        : event.key === 'ArrowLeft' || event.key === 'ArrowUp'
          ? (current + acts.length - 1) % acts.length
          : event.key === 'Home'
            ? 0
            : event.key === 'End'
              ? acts.length - 1
              : null;
    if (to === null) return;
    event.preventDefault();
    setCurrent(to);
    bar.current?.querySelectorAll<HTMLElement>('button')[to]?.focus();
  };

  return (
    <div
      ref={bar}
      role="toolbar"
      tabIndex={-1}
      aria-label="Story tools"
      aria-controls={controls}
      onKeyDown={move}
      className="flex flex-wrap gap-x-3 gap-y-0.5 border-b border-line py-1"
    >
      {groups.map((group) => (
        <div key={group[0]?.id} className="flex flex-wrap">
          {group.map((act) => {
            const index = acts.indexOf(act);
            const on = act.isOn?.(editor) ?? false;
            const idle = !(act.can?.(editor) ?? true);
            return (
              <button
                key={act.id}
                type="button"
                tabIndex={index === current ? 0 : -1}
                aria-pressed={act.isOn ? on : undefined}
                aria-disabled={idle || undefined}
                title={act.keys ? `${act.words} (${keyWords(act.keys)})` : undefined}
                aria-keyshortcuts={act.keys?.replace('Mod', isMac ? 'Meta' : 'Control')}
                // Pressed with the mouse, the words that are marked stay marked.
                onMouseDown={(event) => event.preventDefault()}
                onFocus={() => setCurrent(index)}
                onClick={() => {
                  if (!idle) act.run(editor);
                }}
                className={`min-h-9 border-b-2 px-2 text-small leading-tight font-[550] touch:min-h-11 aria-disabled:cursor-not-allowed aria-disabled:opacity-50 ${on ? 'border-verdigris bg-verdigris-tint text-verdigris-ink' : 'border-transparent text-soot hover:bg-ash-2'} ${act.id === 'bold' ? 'font-[750]' : ''} ${act.id === 'italic' ? 'italic' : ''}`}
              >
                {act.words}
              </button>
            );
          })}
        </div>
      ))}
    </div>
  );
}
