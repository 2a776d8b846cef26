import { NodeViewWrapper, type NodeViewProps } from '@tiptap/react';
import { pictureUrl } from '#shared/api/pictures.ts';
import { IconButton } from '../../ui/IconButton.tsx';
import { TextField } from '../../ui/TextField.tsx';
import { useWriteForm } from '../form-context.ts';
import { moveBlock } from './picture-places.ts';
import { ALT_CHARACTERS, CAPTION_CHARACTERS } from './to-story.ts';

/** Wide enough for the column on a sharp screen, where the picture has that size. */
const SHOWN_WIDTH = 960;

/** A placed picture while writing: what it shows, its caption, and buttons for every move. */
export function PictureInStory({
  node,
  editor,
  getPos,
  updateAttributes,
  deleteNode,
}: NodeViewProps) {
  const { draft, editable } = useWriteForm();
  const name = String(node.attrs['name']);
  const alt = String(node.attrs['alt']);
  const index = draft.pictures.findIndex((one) => one.name === name);
  const picture = draft.pictures[index];
  const called = alt.trim() || (index < 0 ? 'this picture' : `picture ${index + 1}`);
  const width = picture?.widths.find((one) => one >= SHOWN_WIDTH) ?? picture?.widths.at(-1);

  const move = (by: -1 | 1): void => {
    const from = getPos();
    if (from === undefined) return;
    let to: number | null = null;
    editor.commands.command(({ state, tr }) => {
      to = moveBlock(state, tr, from, by);
      return to !== null;
    });
    // The picture is drawn anew at its new place; its button keeps the focus there.
    requestAnimationFrame(() => {
      const drawn = to === null ? null : editor.view.nodeDOM(to);
      if (!(drawn instanceof HTMLElement)) return;
      drawn.querySelector<HTMLElement>(`[data-move="${by}"] button`)?.focus();
      drawn.scrollIntoView({ block: 'nearest' });
    });
  };

  return (
    <NodeViewWrapper as="figure" className="story-picture @container" data-name={name}>
      {picture && width !== undefined ? (
        <img
          src={pictureUrl(name, width)}
          alt={alt}
          width={picture.width}
          height={picture.height}
          className="block h-auto max-h-96 w-auto max-w-full"
        />
      ) : (
        <p className="border border-dashed border-soot-2 px-4 py-8 text-small text-soot-2">
          This picture is not among this note’s pictures any more. Remove it here.
        </p>
      )}
      <div data-controls="" className="space-y-2 py-2 font-sans">
        <TextField
          label="What it shows"
          required
          hint="For those who cannot see it, in a sentence."
          value={alt}
          maxLength={ALT_CHARACTERS}
          onValue={(next) => updateAttributes({ alt: next })}
          issues={
            alt.trim() === '' && editable
              ? [{ kind: 'must-mend', text: 'Say what the picture shows.' }]
              : []
          }
          disabled={!editable}
        />
        <TextField
          label="Caption"
          hint="Printed under the picture; may stay blank."
          value={String(node.attrs['caption'])}
          maxLength={CAPTION_CHARACTERS}
          onValue={(next) => updateAttributes({ caption: next })}
          disabled={!editable}
        />
        {editable && (
          <div className="flex gap-1">
            <span data-move="-1">
              <IconButton icon="up" label={`Move ${called} up`} onClick={() => move(-1)} />
            </span>
            <span data-move="1">
              <IconButton icon="down" label={`Move ${called} down`} onClick={() => move(1)} />
            </span>
            <IconButton
              icon="remove"
              label={`Take ${called} out of the story`}
              onClick={() => {
                deleteNode();
                editor.commands.focus();
              }}
            />
          </div>
        )}
      </div>
    </NodeViewWrapper>
  );
}
