import type { Editor } from '@tiptap/react';
import { NodeSelection } from '@tiptap/pm/state';
import type { EditorState, Transaction } from '@tiptap/pm/state';

/**
 * Where a picture goes: below the block with the cursor, and below the pictures that already stand
 * there, so that several come in the order they were chosen in. An empty paragraph gives way.
 */
export function pictureRange(state: EditorState): { from: number; to: number } {
  const { $from } = state.selection;
  const { doc } = state;
  const index = $from.index(0);
  const block = doc.maybeChild(index);
  if (!block) return { from: doc.content.size, to: doc.content.size };
  const start = $from.posAtIndex(index, 0);
  if (block.type.name === 'paragraph' && block.content.size === 0) {
    return { from: start, to: start + block.nodeSize };
  }
  let at = start + block.nodeSize;
  for (let next = index + 1; doc.maybeChild(next)?.type.name === 'picture'; next += 1) {
    at += doc.child(next).nodeSize;
  }
  return { from: at, to: at };
}

/** Places a picture of the note without taking the cursor away from where it is. */
export function placePicture(editor: Editor, name: string): boolean {
  const type = editor.schema.nodes['picture'];
  if (!type || editor.isDestroyed) return false;
  return editor.commands.command(({ tr, state, dispatch }) => {
    const { from, to } = pictureRange(state);
    if (dispatch) tr.replaceWith(from, to, type.create({ name, alt: '', caption: '' }));
    return true;
  });
}

/**
 * Moves the block at a place above or below its neighbour.
 * @returns where it stands then; null where there is no neighbour
 */
export function moveBlock(
  state: EditorState,
  tr: Transaction,
  from: number,
  by: -1 | 1,
): number | null {
  const at = state.doc.resolve(from);
  const index = at.index(0);
  const block = state.doc.maybeChild(index);
  const neighbour = state.doc.maybeChild(index + by);
  if (!block || !neighbour || at.depth !== 0) return null;
  const to = by === -1 ? from - neighbour.nodeSize : from + neighbour.nodeSize;
  tr.delete(from, from + block.nodeSize).insert(to, block);
  tr.setSelection(NodeSelection.create(tr.doc, to));
  return to;
}
