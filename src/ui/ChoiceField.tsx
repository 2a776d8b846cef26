import { Button } from './Button.tsx';
import { ChoiceCell } from './ChoiceCell.tsx';
import type { FieldProps } from './field-issue.ts';
import { FieldFrame } from './FieldFrame.tsx';
import type { Option } from './options.ts';
import { useFieldIds } from './useFieldIds.ts';

interface Props<Value extends string> extends FieldProps {
  readonly value: Value | null;
  readonly onValue: (value: Value | null) => void;
  readonly options: readonly Option<Value>[];
}

/** One of a few, all in sight. What is not needed can be left blank again. */
export function ChoiceField<Value extends string>(props: Props<Value>) {
  const ids = useFieldIds(props);
  const invalid = ids.control['aria-invalid'];
  return (
    <FieldFrame field={props} ids={ids} group>
      <div
        role="radiogroup"
        id={ids.id}
        aria-labelledby={ids.labelId}
        aria-describedby={ids.control['aria-describedby']}
        aria-required={ids.control['aria-required']}
        aria-invalid={invalid}
        className="flex flex-wrap items-center pl-px pt-px"
      >
        {props.options.map((option) => (
          <ChoiceCell
            key={option.value}
            type="radio"
            name={ids.id}
            label={option.label}
            checked={props.value === option.value}
            onChecked={() => props.onValue(option.value)}
            disabled={props.disabled}
          />
        ))}
        {!props.required && !props.disabled && props.value !== null && (
          <span className="ml-2">
            <Button kind="quiet" label={`Clear ${props.label}`} onClick={() => props.onValue(null)}>
              Clear
            </Button>
          </span>
        )}
      </div>
    </FieldFrame>
  );
}
