import { ChoiceCell } from './ChoiceCell.tsx';
import type { FieldProps } from './field-issue.ts';
import { FieldFrame } from './FieldFrame.tsx';
import type { Option } from './options.ts';
import { useFieldIds } from './useFieldIds.ts';

interface Props<Value extends string> extends FieldProps {
  readonly values: readonly Value[];
  readonly onValues: (values: readonly Value[]) => void;
  readonly options: readonly Option<Value>[];
}

/** Any number of a list, kept in the list's order. */
export function ManyChoiceField<Value extends string>(props: Props<Value>) {
  const ids = useFieldIds(props);
  const toggle = (value: Value, checked: boolean) =>
    props.onValues(
      props.options
        .map((option) => option.value)
        .filter((one) => (one === value ? checked : props.values.includes(one))),
    );
  return (
    <FieldFrame field={props} ids={ids} group>
      <div
        role="group"
        id={ids.id}
        aria-labelledby={ids.labelId}
        aria-describedby={ids.control['aria-describedby']}
        className="flex flex-wrap pl-px pt-px"
      >
        {props.options.map((option) => (
          <ChoiceCell
            key={option.value}
            type="checkbox"
            name={`${ids.id}-${option.value}`}
            label={option.label}
            checked={props.values.includes(option.value)}
            onChecked={(checked) => toggle(option.value, checked)}
            disabled={props.disabled}
            invalid={ids.control['aria-invalid']}
          />
        ))}
      </div>
    </FieldFrame>
  );
}
