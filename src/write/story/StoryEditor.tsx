import { EditorContent } from '@tiptap/react';
import { useId, useRef, useState } from 'react';
import { MAX_PICTURES, PICTURE_ACCEPT, type Picture } from '#shared/api/pictures.ts';
import { picturesIn } from '#shared/note/story.ts';
import { IssueList } from '../../ui/IssueList.tsx';
import { useMessages } from '../../ui/useMessages.ts';
import { useWriteForm } from '../form-context.ts';
import { LinkDialog } from './LinkDialog.tsx';
import { placePicture } from './picture-places.ts';
import { PictureUploads } from './PictureUploads.tsx';
import { StoryToolbar } from './StoryToolbar.tsx';
import { UnplacedPictures } from './UnplacedPictures.tsx';
import { looksLikeTable, useFileDrop } from './useFileDrop.ts';
import { usePictureUploads } from './usePictureUploads.ts';
import { useStoryEditor } from './useStoryEditor.ts';
import './story-editor.css';

/** The story's text with its pictures. Fetched apart from the page: an editor is a lot of code. */
export function StoryEditor() {
  const { fields, draft, keeper, change, editable, issuesAt } = useWriteForm();
  const tell = useMessages();
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const [address, setAddress] = useState<string | null>(null);

  const editor = useStoryEditor({
    story: fields.story,
    editable,
    attributes: {
      id,
      class: 'story',
      role: 'textbox',
      'aria-multiline': 'true',
      'aria-labelledby': `${id}-label`,
      'aria-describedby': `${id}-hint`,
    },
    onStory: (story) => change((before) => ({ ...before, story })),
    onSignal: (signal) => {
      switch (signal.kind) {
        case 'link':
          askAddress();
          return;
        case 'pictures':
          addPictures(signal.files);
          return;
        case 'too-long':
          tell({ kind: 'error', text: 'A story cannot be longer than this, or nested deeper.' });
      }
    },
  });

  const work = usePictureUploads(draft.id, (picture) => {
    const now = keeper.current();
    keeper.accept({
      ...now.draft,
      fields: now.fields,
      pictures: [...now.draft.pictures, picture],
    });
    placePicture(editor, picture.name);
  });
  const room = MAX_PICTURES - draft.pictures.length - work.uploads.length;
  function addPictures(files: readonly File[]): void {
    if (files.length > room) {
      tell({
        kind: 'error',
        text: `A note holds at most ${MAX_PICTURES} pictures: ${Math.max(0, room)} more can be added.`,
      });
    }
    work.add(files.slice(0, Math.max(0, room)));
  }
  function askAddress(): void {
    const href: unknown = editor.getAttributes('link')['href'];
    setAddress(typeof href === 'string' ? href : '');
  }
  function setLink(next: string | null): void {
    setAddress(null);
    const chain = editor.chain().focus().extendMarkRange('link');
    if (next === null) chain.unsetLink().run();
    else if (editor.state.selection.empty && !editor.isActive('link')) {
      // Nothing is marked: the address itself becomes the words.
      chain
        .insertContent({
          type: 'text',
          text: next,
          marks: [{ type: 'link', attrs: { href: next } }],
        })
        .run();
    } else chain.setLink({ href: next }).run();
  }
  useFileDrop({
    takes: (file) => !looksLikeTable(file),
    onFiles: addPictures,
    disabled: !editable,
  });

  const placed = new Set(picturesIn(fields.story));
  const numberOf = (picture: Picture): number =>
    draft.pictures.findIndex(({ name }) => name === picture.name) + 1;

  return (
    <div className="story-editor space-y-4">
      <div>
        <p className="flex flex-wrap justify-between gap-x-4 text-small">
          <span id={`${id}-label`} className="font-[550]">
            How it went <span className="text-soot-2">(needed)</span>
          </span>
          <span id={`${id}-hint`} className="text-soot-2">
            Pictures may be dropped anywhere on this page.
          </span>
        </p>
        <div className="mt-1 border-b border-l border-soot-2 bg-ash-2 focus-within:outline-2 focus-within:outline-offset-1 focus-within:outline-verdigris">
          {editable && (
            <StoryToolbar
              editor={editor}
              controls={id}
              onLink={askAddress}
              onPictures={() => input.current?.click()}
            />
          )}
          <EditorContent editor={editor} />
        </div>
        <IssueList issues={issuesAt('/story')} />
      </div>
      <input
        ref={input}
        type="file"
        aria-label="Pictures"
        className="sr-only"
        tabIndex={-1}
        multiple
        accept={PICTURE_ACCEPT}
        onChange={(event) => {
          const files = [...(event.currentTarget.files ?? [])];
          event.currentTarget.value = '';
          addPictures(files);
        }}
      />
      <PictureUploads work={work} />
      <UnplacedPictures
        pictures={draft.pictures.filter(({ name }) => !placed.has(name))}
        numberOf={numberOf}
        editable={editable}
        keeper={keeper}
        onPlace={(picture) => placePicture(editor, picture.name)}
      />
      <LinkDialog address={address} onClose={() => setAddress(null)} onAddress={setLink} />
    </div>
  );
}
