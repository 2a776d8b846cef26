import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { useRepeatKey } from '../http/useRepeatKey.ts';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { blankKiln } from './kiln-form-fields.ts';
import { useAddKiln } from './kiln-mutations.ts';
import { KilnForm } from './KilnForm.tsx';

/** Describes a kiln, once; notes then only name it. */
export function NewKilnPage() {
  usePageTitle('A new kiln');
  const { abilities, known } = useSession();
  const navigate = useNavigate();
  const tell = useMessages();
  const add = useAddKiln();
  const [blank] = useState(() => blankKiln(Intl.DateTimeFormat().resolvedOptions().timeZone));
  const keyFor = useRepeatKey();
  if (!known) return <Skeleton words="The form is being fetched" shape="sheet" />;
  if (!abilities.write) {
    return (
      <EmptyState
        headingLevel={1}
        title="Sign in to describe a kiln"
        action={
          <LinkButton kind="main" to={paths.signIn(paths.newKiln)}>
            Sign in
          </LinkButton>
        }
      >
        Kilns are kept by members.
      </EmptyState>
    );
  }
  return (
    <div className="space-y-8">
      <div className="space-y-2">
        <h1 className="text-title">A new kiln</h1>
        <p className="max-w-measure text-soot-2">
          Described once. When you alter it later, notes of earlier firings keep the kiln as it was.
          Only the name and the fuel are needed; the rest makes comparing possible.
        </p>
      </div>
      <KilnForm
        initial={blank}
        saveWords="Keep this kiln"
        isSaving={add.isPending}
        error={add.error}
        onSave={(fields, release) =>
          add.mutate(
            { fields, key: keyFor(fields) },
            {
              onSuccess: (kiln) => {
                release();
                tell({ kind: 'done', text: `${kiln.fields.name} is kept.` });
                void navigate(paths.kiln(kiln.id));
              },
            },
          )
        }
      />
    </div>
  );
}
