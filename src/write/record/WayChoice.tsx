import { useId } from 'react';
import { ChoiceCell } from '../../ui/ChoiceCell.tsx';

const WAY_WORDS = { type: 'Type them', paste: 'Paste columns', file: 'Upload a file' } as const;
export type Way = keyof typeof WAY_WORDS;

interface Props {
  readonly label: string;
  readonly ways: readonly Way[];
  readonly way: Way;
  readonly onWay: (way: Way) => void;
}

/** Which of the ways in is open: always exactly one. */
export function WayChoice({ label, ways, way, onWay }: Props) {
  const name = useId();
  return (
    <div role="radiogroup" aria-label={label} className="flex flex-wrap pt-px pl-px">
      {ways.map((one) => (
        <ChoiceCell
          key={one}
          type="radio"
          name={name}
          label={WAY_WORDS[one]}
          checked={one === way}
          onChecked={() => onWay(one)}
          disabled={false}
        />
      ))}
    </div>
  );
}
