import type { HTMLInputAutoCompleteAttribute } from 'react';
import type { FieldProps } from './field-issue.ts';
import { FieldFrame } from './FieldFrame.tsx';
import { useFieldIds } from './useFieldIds.ts';

interface Props extends FieldProps {
  readonly value: string;
  readonly onValue: (value: string) => void;
  readonly type?: 'text' | 'email' | 'password' | 'search' | 'url';
  readonly autoComplete?: HTMLInputAutoCompleteAttribute;
  readonly maxLength?: number;
  readonly placeholder?: string;
  readonly spellCheck?: boolean;
}

export function TextField(props: Props) {
  const ids = useFieldIds(props);
  return (
    <FieldFrame field={props} ids={ids}>
      <input
        {...ids.control}
        className="field-corner w-full"
        type={props.type ?? 'text'}
        value={props.value}
        onChange={(event) => props.onValue(event.currentTarget.value)}
        disabled={props.disabled}
        autoComplete={props.autoComplete}
        maxLength={props.maxLength}
        placeholder={props.placeholder}
        spellCheck={props.spellCheck}
      />
    </FieldFrame>
  );
}
