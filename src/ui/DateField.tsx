import type { FieldProps } from './field-issue.ts';
import { FieldFrame } from './FieldFrame.tsx';
import { useFieldIds } from './useFieldIds.ts';

interface Props extends FieldProps {
  /** yyyy-mm-dd, '' for none. */
  readonly value: string;
  readonly onValue: (value: string) => void;
  readonly min?: string;
  readonly max?: string;
}

export function DateField(props: Props) {
  const ids = useFieldIds(props);
  return (
    <FieldFrame field={props} ids={ids}>
      <input
        {...ids.control}
        type="date"
        className="field-corner reading text-body"
        value={props.value}
        onChange={(event) => props.onValue(event.currentTarget.value)}
        min={props.min}
        max={props.max}
        disabled={props.disabled}
      />
    </FieldFrame>
  );
}
