import { useState } from 'react';
import { MAX_MARKS } from '#shared/note/plan.ts';
import { MARKS, type MarkKind } from '#shared/vocabulary/marks.ts';
import { Button } from '../../ui/Button.tsx';
import { IconButton } from '../../ui/IconButton.tsx';
import { IssueList } from '../../ui/IssueList.tsx';
import { LiveRegion } from '../../ui/LiveRegion.tsx';
import { optionsOf } from '../../ui/options.ts';
import { SelectField } from '../../ui/SelectField.tsx';
import { TextField } from '../../ui/TextField.tsx';
import { useWriteForm } from '../form-context.ts';
import { CellInput } from './CellInput.tsx';
import { areMarksInOrder, hasPercent, marksInOrder, type TypedMark } from './marks-order.ts';
import { minuteCell, percentCell } from './typed-cells.ts';

const KINDS = optionsOf(MARKS);

/** What was done when: each mark on a line, by minute. */
export function MarksEditor() {
  const { fields, change, editable, issuesAt } = useWriteForm();
  const { marks } = fields.record;
  const [spoken, setSpoken] = useState('');
  const put = (next: TypedMark[]): void => {
    change((before) => ({ ...before, record: { ...before.record, marks: next } }));
  };
  return (
    <div className="@container space-y-3">
      <h3 className="text-body">What was done, and when</h3>
      <IssueList issues={issuesAt('/record/marks')} />
      {marks.length > 0 && (
        <ol
          className="border-t border-soot-2"
          // While a minute is being typed its line stays where it is.
          onBlur={(event) => {
            const leaves = !event.currentTarget.contains(event.relatedTarget);
            if (leaves && !areMarksInOrder(marks)) {
              put(marksInOrder(marks));
              setSpoken('Marks put in order of time');
            }
          }}
        >
          {marks.map((mark, index) => (
            <MarkLine
              key={index}
              mark={mark}
              number={index + 1}
              disabled={!editable}
              onMark={(next) => put(marks.map((one, at) => (at === index ? next : one)))}
              onRemove={() => {
                put(marks.filter((_, at) => at !== index));
                setSpoken(`${MARKS[mark.kind]} removed`);
              }}
            />
          ))}
        </ol>
      )}
      {editable && (
        <NewMark
          full={marks.length >= MAX_MARKS}
          onAdd={(minute, kind) => {
            put(marksInOrder([...marks, { minute, kind, percent: null, detail: '' }]));
            setSpoken(`${MARKS[kind]} added`);
          }}
        />
      )}
      <LiveRegion text={spoken} quietMs={300} />
    </div>
  );
}

interface LineProps {
  readonly mark: TypedMark;
  readonly number: number;
  readonly disabled: boolean;
  readonly onMark: (mark: TypedMark) => void;
  readonly onRemove: () => void;
}

function MarkLine({ mark, number, disabled, onMark, onRemove }: LineProps) {
  const words = MARKS[mark.kind].toLowerCase();
  return (
    <li className="grid grid-cols-[6.5rem_minmax(0,1fr)_2.75rem] items-start gap-x-3 gap-y-1 border-b border-line py-1.5 @2xl:grid-cols-[6.5rem_11rem_6rem_minmax(0,1fr)_2.75rem]">
      <CellInput
        label={`Minute of mark ${number}, ${words}`}
        kind={minuteCell}
        value={mark.minute}
        // A mark has a minute: an emptied cell keeps the old one until another is typed.
        onValue={(minute) => minute !== null && onMark({ ...mark, minute })}
        unit="min"
        disabled={disabled}
      />
      <SelectField
        label={`Kind of mark ${number}`}
        labelHidden
        value={mark.kind}
        onValue={(kind) =>
          kind && onMark({ ...mark, kind, percent: hasPercent(kind) ? mark.percent : null })
        }
        options={KINDS}
        blank={null}
        disabled={disabled}
      />
      <span className="order-last col-span-2 @2xl:order-none @2xl:col-span-1">
        {hasPercent(mark.kind) && (
          <CellInput
            label={`Flue covered after mark ${number}, per cent`}
            kind={percentCell}
            value={mark.percent}
            onValue={(percent) => onMark({ ...mark, percent })}
            unit="%"
            disabled={disabled}
          />
        )}
      </span>
      <span className="order-last col-span-3 @2xl:order-none @2xl:col-span-1">
        <TextField
          label={mark.kind === 'drawn' ? `Which piece, mark ${number}` : `Detail of mark ${number}`}
          labelHidden
          placeholder={mark.kind === 'drawn' ? 'Which piece' : 'Detail'}
          value={mark.detail}
          maxLength={80}
          onValue={(detail) => onMark({ ...mark, detail })}
          disabled={disabled}
        />
      </span>
      {disabled ? (
        <span />
      ) : (
        <span className="pt-1 touch:pt-0">
          <IconButton icon="remove" label={`Remove mark ${number}, ${words}`} onClick={onRemove} />
        </span>
      )}
    </li>
  );
}

interface NewProps {
  readonly full: boolean;
  readonly onAdd: (minute: number, kind: MarkKind) => void;
}

function NewMark({ full, onAdd }: NewProps) {
  const [minute, setMinute] = useState<number | null>(null);
  const [kind, setKind] = useState<MarkKind | null>(null);
  // A new cell for each mark, so that the last one's text does not stay.
  const [added, setAdded] = useState(0);
  const missing = minute === null || kind === null;
  const add = (): void => {
    if (minute === null || kind === null || full) return;
    onAdd(minute, kind);
    setMinute(null);
    setKind(null);
    setAdded(added + 1);
  };
  return (
    <div className="space-y-1">
      <div
        role="group"
        aria-label="New mark"
        className="flex flex-wrap items-start gap-x-3 gap-y-2"
      >
        <span className="w-26">
          <CellInput
            key={added}
            label="Minute of the new mark"
            kind={minuteCell}
            value={minute}
            onValue={setMinute}
            unit="min"
            onKeyDown={(event) => {
              if (event.key !== 'Enter') return;
              event.preventDefault();
              add();
            }}
          />
        </span>
        <SelectField
          label="Kind of the new mark"
          labelHidden
          value={kind}
          onValue={setKind}
          options={KINDS}
          blank="What was done"
        />
        <Button icon="add" disabled={missing || full} onClick={add}>
          Add mark
        </Button>
      </div>
      <p className="text-note text-soot-2">
        {full
          ? `${MAX_MARKS} marks are the most a record holds.`
          : 'Minutes of the record, or hours and minutes such as 1:05.'}
      </p>
    </div>
  );
}
