import { useRef, useState, type ReactNode, type SyntheticEvent } from 'react';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemError } from '../http/client.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { KilnDrawingFigure } from './KilnDrawingFigure.tsx';
import { kilnIssues, refusedFields, tidiedKiln } from './kiln-form-fields.ts';
import { KilnFormFields } from './KilnFormFields.tsx';
import { useUnsavedGuard } from './useUnsavedGuard.tsx';

interface Props {
  readonly initial: KilnFields;
  readonly saveWords: string;
  readonly isSaving: boolean;
  readonly error: Error | null;
  /** Resolves when it is saved, and says then where to go. */
  readonly onSave: (fields: KilnFields, release: () => void) => void;
  /** What a refused save has to say beside the button. */
  readonly refusal?: (take: (fields: KilnFields) => void, mine: KilnFields) => ReactNode;
}

/** A kiln's description, with its drawing growing beside it. */
export function KilnForm({ initial, saveWords, isSaving, error, onSave, refusal }: Props) {
  const { units } = useSession();
  const [fields, setFields] = useState(initial);
  const [hasTried, setHasTried] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  const guard = useUnsavedGuard(JSON.stringify(fields) !== JSON.stringify(initial));
  const tidied = tidiedKiln(fields);
  const open = kilnIssues(tidied, units);
  const refused = error instanceof ProblemError ? refusedFields(error.problem.errors ?? []) : {};
  const submit = (event: SyntheticEvent): void => {
    event.preventDefault();
    if (isSaving) return;
    setHasTried(true);
    if (Object.keys(open).length > 0) {
      // After the marks are on the page, the first of them takes the focus.
      requestAnimationFrame(() => {
        form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
      });
      return;
    }
    onSave(tidied, guard.release);
  };
  return (
    <form ref={form} noValidate onSubmit={submit} className="space-y-8">
      <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div className="order-2 min-w-0 lg:order-1">
          <KilnFormFields
            form={{
              fields,
              change: (part) => setFields((before) => ({ ...before, ...part })),
              issues: { ...refused, ...(hasTried ? open : {}) },
              units,
            }}
          />
        </div>
        <div className="order-1 min-w-0 lg:order-2">
          <div className="lg:sticky lg:top-6">
            <KilnDrawingFigure fields={tidied} />
          </div>
        </div>
      </div>
      {refusal?.(setFields, tidied) ??
        (error && (
          <Notice kind="error" heading="This was not saved" appeared>
            {error.message} What you typed is still here.
          </Notice>
        ))}
      <div className="flex flex-wrap items-center gap-4 border-t-2 border-soot pt-4">
        <Button kind="main" type="submit" busy={isSaving}>
          {saveWords}
        </Button>
        {hasTried && Object.keys(open).length > 0 && (
          <p role="alert" className="text-small font-[600] text-caution">
            Something above must be mended first.
          </p>
        )}
      </div>
      {guard.question}
    </form>
  );
}
