import { useEffect, useRef, type ReactNode } from 'react';
import { FormProblem } from './FormProblem.tsx';

interface Props {
  readonly onSubmit: () => void;
  /** Why it was not taken the last time. */
  readonly error: unknown;
  /** Pointers of the fields in it that show their own faults. */
  readonly fields: readonly string[];
  /** Its name, where a page has several. */
  readonly labelledBy?: string;
  readonly children: ReactNode;
}

/**
 * A form whose checks are ours. After a refusal the first field that is wrong has the focus, so that
 * nobody has to look for it.
 */
export function AccountForm({ onSubmit, error, fields, labelledBy, children }: Props) {
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    if (error === null || error === undefined) return;
    form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [error]);
  return (
    <form
      ref={form}
      noValidate
      aria-labelledby={labelledBy}
      className="@container space-y-2"
      onSubmit={(event) => {
        event.preventDefault();
        onSubmit();
      }}
    >
      {children}
      <FormProblem error={error} fields={fields} />
    </form>
  );
}
