import type { FieldProps } from './field-issue.ts';
import { FieldFrame } from './FieldFrame.tsx';
import { useFieldIds } from './useFieldIds.ts';

interface Props extends FieldProps {
  readonly value: string;
  readonly onValue: (value: string) => void;
  readonly rows?: number;
  readonly maxLength?: number;
}

/** Grows with what is written where the browser can; counts down near its end. */
export function TextArea(props: Props) {
  const ids = useFieldIds(props);
  const left = props.maxLength === undefined ? null : props.maxLength - props.value.length;
  return (
    <FieldFrame field={props} ids={ids}>
      <textarea
        {...ids.control}
        className="field-corner field-sizing-content w-full leading-normal"
        value={props.value}
        onChange={(event) => props.onValue(event.currentTarget.value)}
        rows={props.rows ?? 4}
        disabled={props.disabled}
        maxLength={props.maxLength}
      />
      {left !== null && left <= 100 && (
        <p className="text-note text-soot-2">{left} characters left</p>
      )}
    </FieldFrame>
  );
}
