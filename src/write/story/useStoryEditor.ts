import { useEditor, type Editor, type JSONContent } from '@tiptap/react';
import { useEffect, useEffectEvent, useRef, useState } from 'react';
import type { Story } from '#shared/note/story.ts';
import { storyExtensions } from './story-extensions.ts';
import { signalLine, type Signal } from './story-signals.ts';
import { fromStory, toStory, type EditorNode } from './to-story.ts';

interface Options {
  readonly story: Story;
  readonly onStory: (story: Story) => void;
  readonly editable: boolean;
  readonly attributes: Record<string, string>;
  readonly onSignal: Signal;
}

const contentOf = (story: Story): JSONContent => fromStory(story) as JSONContent;

/** The editor of one story: what is written goes out as a story, what changed outside comes in. */
export function useStoryEditor(options: Options): Editor {
  const { story, onStory, editable } = options;
  const [line] = useState(signalLine);
  // The story as the editor has it: taken in last, or written here.
  const known = useRef<string | null>(null);
  // Stories that came from here: seen again late, while typing goes on, they are no news.
  const own = useRef(new WeakSet<Story>());

  const editor = useEditor(
    {
      extensions: storyExtensions(line.send),
      content: contentOf(story),
      editable,
      injectCSS: false,
      editorProps: { attributes: options.attributes },
    },
    [],
  );

  const written = useEffectEvent(() => {
    const next = toStory(editor.getJSON() as EditorNode);
    const text = JSON.stringify(next);
    if (text === known.current) return;
    known.current = text;
    own.current.add(next);
    onStory(next);
  });
  const heard = useEffectEvent((signal: Parameters<Signal>[0]) => options.onSignal(signal));
  useEffect(() => {
    const update = (): void => written();
    editor.on('update', update);
    const stop = line.listen((signal) => heard(signal));
    return () => {
      editor.off('update', update);
      stop();
    };
  }, [editor, line]);

  useEffect(() => {
    if (editor.isEditable !== editable) editor.setEditable(editable, false);
  }, [editor, editable]);

  // A conflict settled for the other version, or a save elsewhere taken over.
  useEffect(() => {
    if (own.current.has(story)) return;
    const text = JSON.stringify(fromStory(story));
    if (text === known.current) return;
    const isFirst = known.current === null;
    known.current = text;
    if (!isFirst) editor.commands.setContent(contentOf(story), { emitUpdate: false });
  }, [editor, story]);

  return editor;
}
