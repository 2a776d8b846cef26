import { useEffect, useRef, useState, type FormEvent, type ReactNode } from 'react';
import type { QuestionPart } from '#shared/question/reading-types.ts';
import { differenceCToF, fromCelsius } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { Button } from '../ui/Button.tsx';
import { FieldRow } from '../ui/FieldRow.tsx';
import { NumberField } from '../ui/NumberField.tsx';
import { TextField } from '../ui/TextField.tsx';
import { typedWords, windowOf, withTemperature, withWords, type Window } from './edit-question.ts';
import { rangeUnit } from './range-words.ts';

interface Props {
  readonly q: string;
  readonly part: QuestionPart;
  readonly units: Units;
  readonly onChanged: (q: string) => void;
  readonly onClose: () => void;
}

/** Changes one part of the question: a temperature by its numbers, everything else by its words. */
export function EditPart(props: Props) {
  return props.part.kind === 'temperature' ? (
    <EditTemperature {...props} />
  ) : (
    <EditWords {...props} />
  );
}

function EditFrame({
  onSubmit,
  onClose,
  children,
}: {
  readonly onSubmit: () => void;
  readonly onClose: () => void;
  readonly children: ReactNode;
}) {
  const form = useRef<HTMLFormElement>(null);
  const close = useRef(onClose);
  useEffect(() => {
    close.current = onClose;
  });
  useEffect(() => {
    const own = form.current;
    // To whoever has pressed the part, its field is the next thing.
    own?.querySelector('input')?.focus();
    const onKeyDown = (event: KeyboardEvent): void => {
      if (event.key === 'Escape') close.current();
    };
    own?.addEventListener('keydown', onKeyDown);
    return () => own?.removeEventListener('keydown', onKeyDown);
  }, []);
  return (
    <form
      ref={form}
      className="@container w-full max-w-xl space-y-2 border-y border-line py-3"
      onSubmit={(event: FormEvent) => {
        event.preventDefault();
        onSubmit();
      }}
    >
      {children}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="plain">
          Ask it so
        </Button>
        <Button kind="quiet" onClick={onClose}>
          Leave it
        </Button>
      </div>
    </form>
  );
}

function EditWords({ q, part, onChanged, onClose }: Props) {
  const [words, setWords] = useState(typedWords(q, part));
  const [isEmpty, setEmpty] = useState(false);
  return (
    <EditFrame
      onClose={onClose}
      onSubmit={() => {
        if (words.trim() === '') setEmpty(true);
        else onChanged(withWords(q, part, words.trim()));
      }}
    >
      <TextField
        label="Your words for it"
        value={words}
        onValue={setWords}
        maxLength={80}
        issues={isEmpty ? [{ kind: 'must-mend', text: 'Say it, or leave the part out.' }] : []}
      />
    </EditFrame>
  );
}

const DEFAULT_HALF_CELSIUS = 20;
const MOST_CELSIUS = 1400;

function EditTemperature({ q, part, units, onChanged, onClose }: Props) {
  const before: Window =
    part.kind === 'temperature' ? windowOf(part.value) : { min: null, max: null };
  const { min, max } = before;
  const isOpen = min === null || max === null;
  const [centre, setCentre] = useState<number | null>(isOpen ? (min ?? max) : (min + max) / 2);
  const [half, setHalf] = useState<number | null>(isOpen ? DEFAULT_HALF_CELSIUS : (max - min) / 2);
  const [fault, setFault] = useState<string | null>(null);
  const { unit, toStored } = rangeUnit('peak', units);
  const rate = rangeUnit('crossing', units);
  const ask = (): void => {
    if (centre === null || (!isOpen && half === null)) {
      setFault('A number is needed.');
      return;
    }
    const width = half ?? 0;
    const wanted: Window = isOpen
      ? { min: min === null ? null : centre, max: max === null ? null : centre }
      : { min: centre - width, max: centre + width };
    const next = withTemperature(q, part, wanted, units);
    if (next === null)
      setFault('This cannot be put into the question; change it in its words above.');
    else onChanged(next);
  };
  return (
    <EditFrame onSubmit={ask} onClose={onClose}>
      <FieldRow>
        <NumberField
          label={isOpen ? (min === null ? 'Up to' : 'From') : 'Near'}
          unit={unit}
          value={centre}
          onValue={setCentre}
          toShown={(stored) => fromCelsius(stored, units.temperature)}
          toStored={toStored}
          min={0}
          max={Math.round(fromCelsius(MOST_CELSIUS, units.temperature))}
          decimals={0}
          issues={fault === null ? [] : [{ kind: 'must-mend', text: fault }]}
        />
        {!isOpen && (
          <NumberField
            label="More or less"
            unit={unit}
            value={half}
            onValue={setHalf}
            toShown={units.temperature === 'F' ? differenceCToF : (stored) => stored}
            toStored={rate.toStored}
            min={0}
            decimals={0}
          />
        )}
      </FieldRow>
    </EditFrame>
  );
}
