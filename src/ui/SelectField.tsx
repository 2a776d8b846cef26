import type { FieldProps } from './field-issue.ts';
import { FieldFrame } from './FieldFrame.tsx';
import { Icon } from './Icon.tsx';
import type { Option } from './options.ts';
import { useFieldIds } from './useFieldIds.ts';

interface Props<Value extends string> extends FieldProps {
  readonly value: Value | null;
  readonly onValue: (value: Value | null) => void;
  readonly options: readonly Option<Value>[];
  /** The words of the blank entry; null leaves it out. */
  readonly blank?: string | null;
}

export function SelectField<Value extends string>(props: Props<Value>) {
  const ids = useFieldIds(props);
  const { blank = '–' } = props;
  return (
    <FieldFrame field={props} ids={ids}>
      <span className="relative inline-block max-w-full">
        <select
          {...ids.control}
          className="field-corner appearance-none pr-9"
          value={props.value ?? ''}
          onChange={(event) => {
            const chosen = props.options.find(({ value }) => value === event.currentTarget.value);
            props.onValue(chosen?.value ?? null);
          }}
          disabled={props.disabled}
        >
          {blank !== null && <option value="">{blank}</option>}
          {props.options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
        <Icon
          name="down"
          className="pointer-events-none absolute right-2.5 top-1/2 size-3.5 -translate-y-1/2"
        />
      </span>
    </FieldFrame>
  );
}
