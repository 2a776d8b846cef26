import type { DeskNote } from '#shared/api/desk.ts';
import { useRepeatKey } from '../http/useRepeatKey.ts';
import { momentWords } from '../notes/note-words.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { Button } from '../ui/Button.tsx';
import { IconButton } from '../ui/IconButton.tsx';
import { SelectField } from '../ui/SelectField.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { useMessages } from '../ui/useMessages.ts';
import type { KeptDeskText } from './kept-desk-text.ts';
import { pinWords, remarkPins } from './remark-pins.ts';
import type { AtTheDesk } from './useDeskNote.ts';

interface Props {
  readonly desk: AtTheDesk;
  readonly data: DeskNote;
  readonly typed: KeptDeskText;
  readonly onTyped: (part: Partial<KeptDeskText>) => void;
}

/** Remarks pinned to fields; the author is told of them with the decision. */
export function DeskRemarks({ desk, data, typed, onTyped }: Props) {
  const tell = useMessages();
  const { addRemark, removeRemark } = desk;
  const keyFor = useRepeatKey();
  const pins = remarkPins(data.page.fields);
  const options = pins.some(({ value }) => value === typed.pointer)
    ? pins
    : [...pins, { value: typed.pointer, label: pinWords(typed.pointer) }];
  const pin = (): void => {
    // The same remark twice is meant only when a first one is there already.
    const remark = { pointer: typed.pointer, text: typed.remark };
    addRemark.mutate(
      { ...remark, key: keyFor(remark) },
      {
        onSuccess: () => {
          onTyped({ remark: '', pointer: '' });
          tell({ kind: 'done', text: 'The remark is pinned.' });
        },
      },
    );
  };
  return (
    <section aria-labelledby="remarks" className="space-y-3">
      <h2 id="remarks" className="text-section">
        Remarks
      </h2>
      {data.remarks.length > 0 && (
        <ul className="border-t border-soot-2 text-small">
          {data.remarks.map((remark) => (
            <li key={remark.id} className="flex gap-3 border-b border-line py-2">
              <div className="min-w-0 grow">
                <p className="font-[600]">{pinWords(remark.pointer)}</p>
                <p>{remark.text}</p>
                <p className="text-note text-soot-2">
                  {remark.by?.name ?? 'A former moderator'}, {momentWords(remark.at)}
                  {remark.mended && `${FACT_SEPARATOR}mended, the author says`}
                </p>
              </div>
              {data.abilities.remark && (
                <IconButton
                  icon="remove"
                  label={`Remove the remark on: ${pinWords(remark.pointer)}`}
                  onClick={() =>
                    removeRemark.mutate(remark.id, {
                      onSuccess: () => tell({ kind: 'done', text: 'The remark is gone.' }),
                      onError: (error) => tell({ kind: 'error', text: error.message }),
                    })
                  }
                />
              )}
            </li>
          ))}
        </ul>
      )}
      {data.abilities.remark || typed.remark !== '' ? (
        <div className="@container space-y-2">
          <SelectField
            label="Pinned to"
            blank={null}
            options={options}
            value={typed.pointer}
            onValue={(pointer) => onTyped({ pointer: pointer ?? '' })}
          />
          <TextArea
            label="Remark"
            value={typed.remark}
            onValue={(remark) => onTyped({ remark })}
            maxLength={1000}
            rows={3}
          />
          {addRemark.isError && (
            <p role="alert" className="text-small text-caution">
              {addRemark.error.message} The remark is kept in this browser.
            </p>
          )}
          <Button
            busy={addRemark.isPending}
            disabled={typed.remark.trim() === '' || !data.abilities.remark}
            onClick={pin}
          >
            Pin the remark
          </Button>
        </div>
      ) : (
        data.remarks.length === 0 && <p className="text-small text-soot-2">None yet.</p>
      )}
    </section>
  );
}
