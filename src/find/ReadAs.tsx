import { useEffect, useRef, useState } from 'react';
import type { Units } from '#shared/units/units.ts';
import { Chip } from '../ui/Chip.tsx';
import { Icon } from '../ui/Icon.tsx';
import { partOf } from './edit-question.ts';
import { EditPart } from './EditPart.tsx';
import { chipWords, type ReadAsPart } from './read-as.ts';

interface Props {
  readonly q: string;
  readonly units: Units;
  readonly parts: readonly ReadAsPart[];
  /** The question put otherwise. */
  readonly onChanged: (q: string) => void;
  readonly onToggle: (key: string) => void;
}

/** How the question was understood, in parts; each can be left out and taken in again. */
export function ReadAs({ q, units, parts, onChanged, onToggle }: Props) {
  const [edited, setEdited] = useState<{ readonly q: string; readonly key: string } | null>(null);
  // The question has changed by other means: what was being edited is no part of it any more.
  const part = edited?.q === q ? partOf(q, edited.key, units) : null;
  const list = useRef<HTMLUListElement>(null);
  const pressed = useRef<string | null>(null);
  // The pressed button turns into its opposite: the focus stays on it.
  useEffect(() => {
    if (pressed.current === null) return;
    const item = [...(list.current?.children ?? [])].find(
      (child) => child instanceof HTMLElement && child.dataset['part'] === pressed.current,
    );
    item?.querySelector('button')?.focus();
    pressed.current = null;
  }, [parts, edited]);
  const toggle = (key: string): void => {
    pressed.current = key;
    onToggle(key);
  };
  return (
    <div className="flex flex-wrap items-baseline gap-x-4 gap-y-2">
      <h2 className="text-small font-[450] tracking-normal text-soot-2">Read as</h2>
      {parts.length === 0 ? (
        <p className="text-small">words to look for; no trouble, temperature or ware in it</p>
      ) : (
        <ul ref={list} className="flex flex-wrap gap-2">
          {parts.map((part) => (
            <Part
              key={part.key}
              part={part}
              onEdit={() => setEdited({ q, key: part.key })}
              onToggle={() => toggle(part.key)}
            />
          ))}
        </ul>
      )}
      {part && (
        <div className="basis-full">
          <EditPart
            key={part.key}
            {...{ q, part, units }}
            onChanged={(next) => {
              setEdited(null);
              onChanged(next);
            }}
            onClose={() => {
              pressed.current = part.key;
              setEdited(null);
            }}
          />
        </div>
      )}
    </div>
  );
}

interface PartProps {
  readonly part: ReadAsPart;
  readonly onEdit: () => void;
  readonly onToggle: () => void;
}

function Part({ part, onEdit, onToggle }: PartProps) {
  const words = chipWords(part);
  return (
    <li data-part={part.key}>
      {part.off ? (
        <button
          type="button"
          aria-label={`Take ${words} in again`}
          onClick={onToggle}
          className="inline-flex min-h-8 items-center gap-2 border border-dashed border-soot-2 px-2.5 py-1 text-small text-soot-2 hover:border-verdigris hover:text-verdigris touch:min-h-11"
        >
          <Icon name="add" className="size-3" />
          <s>{words}</s>
        </button>
      ) : (
        <Chip onEdit={onEdit} onRemove={onToggle} removeLabel={`Leave ${words} out`}>
          {words}
        </Chip>
      )}
    </li>
  );
}
