import { useState } from 'react';
import type { Kiln } from '#shared/api/kilns.ts';
import { useRepeatKey } from '../http/useRepeatKey.ts';
import { blankKiln } from '../kilns/kiln-form-fields.ts';
import { useAddKiln } from '../kilns/kiln-mutations.ts';
import { KilnForm } from '../kilns/KilnForm.tsx';
import { Button } from '../ui/Button.tsx';
import { useMessages } from '../ui/useMessages.ts';

/** A new kiln described where it is needed: once, for all its firings. */
export function DescribeKiln(props: {
  readonly onMade: (kiln: Kiln) => void;
  readonly onCancel: () => void;
}) {
  const tell = useMessages();
  const add = useAddKiln();
  const keyFor = useRepeatKey();
  const [blank] = useState(() => blankKiln(Intl.DateTimeFormat().resolvedOptions().timeZone));
  return (
    <div role="group" aria-label="A new kiln" className="space-y-4 border-l-2 border-line pl-4">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <p className="max-w-measure text-small text-soot-2">
          Described once and used for all its firings. Only the name and the fuel are needed; the
          rest makes comparing possible, and can be added later.
        </p>
        <Button kind="quiet" onClick={props.onCancel}>
          Describe none after all
        </Button>
      </div>
      <KilnForm
        initial={blank}
        saveWords="Use this kiln"
        isSaving={add.isPending}
        error={add.error}
        onSave={(fields, release) =>
          add.mutate(
            { fields, key: keyFor(fields) },
            {
              onSuccess: (kiln) => {
                release();
                tell({ kind: 'done', text: `${kiln.fields.name} is described.` });
                props.onMade(kiln);
              },
            },
          )
        }
      />
    </div>
  );
}
