import { Extension } from '@tiptap/react';
import { Plugin, Selection } from '@tiptap/pm/state';
import { MAX_STORY_BYTES, storySchema } from '#shared/note/story.ts';
import { toStory, type EditorNode } from './to-story.ts';

/** What the editor asks of the page around it. */
export type StorySignal =
  | { readonly kind: 'link' }
  | { readonly kind: 'too-long' }
  | { readonly kind: 'pictures'; readonly files: readonly File[] };
export type Signal = (signal: StorySignal) => void;

/** Carries signals out of the editor, which is made once, to whoever listens now. */
export interface SignalLine {
  readonly send: Signal;
  /** @returns what stops listening */
  readonly listen: (listener: Signal) => () => void;
}
export function signalLine(): SignalLine {
  const listeners = new Set<Signal>();
  return {
    send: (signal) => {
      for (const listener of listeners) listener(signal);
    },
    listen: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

/** Whether a document could be kept as it is: within the lengths and depths of a story. */
export function canBeKept(doc: EditorNode): boolean {
  const story = toStory(doc);
  return (
    storySchema.safeParse(story).success &&
    new TextEncoder().encode(JSON.stringify(story)).length <= MAX_STORY_BYTES
  );
}

/** Takes no change after which the story could not be kept any more, and says so. */
function withinLimits(send: Signal): Plugin {
  return new Plugin({
    filterTransaction(transaction) {
      if (!transaction.docChanged || transaction.getMeta('preventUpdate') === true) return true;
      const shrinks = transaction.doc.nodeSize < transaction.before.nodeSize;
      if (shrinks || canBeKept(transaction.doc.toJSON() as EditorNode)) return true;
      send({ kind: 'too-long' });
      return false;
    },
  });
}

/** Pictures pasted or dropped into the text; dropped, they go where they were let fall. */
function takesPictures(send: Signal): Plugin {
  return new Plugin({
    props: {
      handlePaste(_view, event) {
        const data = event.clipboardData;
        const files = [...(data?.files ?? [])].filter((file) => file.type.startsWith('image/'));
        // A sheet or a letter copies its words and a picture of them: the words are meant.
        if (files.length === 0 || data?.types.includes('text/html')) return false;
        send({ kind: 'pictures', files });
        return true;
      },
      handleDrop(view, event) {
        if (!event.dataTransfer?.types.includes('Files')) return false;
        const at = view.posAtCoords({ left: event.clientX, top: event.clientY });
        const { tr, doc } = view.state;
        if (at) view.dispatch(tr.setSelection(Selection.near(doc.resolve(at.pos))));
        // The page's own listener takes the files from here.
        return true;
      },
    },
  });
}

/** What the editor cannot settle by itself, and `Mod-k` for a link. */
export const storySignals = (send: Signal) =>
  Extension.create({
    name: 'storySignals',
    addKeyboardShortcuts() {
      return {
        'Mod-k': () => {
          send({ kind: 'link' });
          return true;
        },
      };
    },
    addProseMirrorPlugins() {
      return [withinLimits(send), takesPictures(send)];
    },
  });
