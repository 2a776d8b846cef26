import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import type { KilnPage } from '#shared/api/kilns.ts';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { paths } from '#shared/paths.ts';
import { ProblemError } from '../http/client.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { Button } from '../ui/Button.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { currentKilnSchema, differingLabels, type CurrentKiln } from './kiln-form-fields.ts';
import { useAlterKiln } from './kiln-mutations.ts';
import { kilnQueries } from './kiln-queries.ts';
import { KilnForm } from './KilnForm.tsx';
import { KilnLoans } from './KilnLoans.tsx';
import { KilnPicture } from './KilnPicture.tsx';
import { RemoveKiln } from './RemoveKiln.tsx';

/** Alters a kiln, lends it, gives it a picture, takes it out of use: each as far as one may. */
export function EditKilnPage() {
  const kilnId = Number(useParams()['id']);
  const kiln = useQuery(kilnQueries.page(kilnId));
  usePageTitle(kiln.data ? `Alter ${kiln.data.fields.name}` : null);
  if (kiln.isPending) {
    return <Skeleton words="The kiln is being fetched" shape="sheet" count={10} />;
  }
  if (!kiln.data) return <ProblemPage error={kiln.error} onRetry={() => void kiln.refetch()} />;
  const { abilities, fields } = kiln.data;
  if (!abilities.edit) {
    return (
      <EmptyState
        headingLevel={1}
        title="You cannot alter this kiln"
        action={<LinkButton to={paths.kiln(kilnId)}>To the kiln</LinkButton>}
      >
        Only its keeper does, while it is in use.
      </EmptyState>
    );
  }
  return (
    <div className="space-y-12">
      <h1 className="text-title">Alter {fields.name}</h1>
      <AlterForm key={kilnId} kiln={kiln.data} />
      <KilnPicture kiln={kiln.data} />
      {abilities.lend && <KilnLoans kiln={kiln.data} />}
      {abilities.remove && <RemoveKiln kiln={kiln.data} />}
    </div>
  );
}

const currentOf = (error: Error | null): CurrentKiln | null => {
  if (!(error instanceof ProblemError) || error.problem.code !== 'stale') return null;
  const parsed = currentKilnSchema.safeParse(error.problem.current);
  return parsed.success ? parsed.data : null;
};

function AlterForm({ kiln }: { readonly kiln: KilnPage }) {
  const navigate = useNavigate();
  const tell = useMessages();
  const alter = useAlterKiln(kiln.id);
  // What was read when the page was opened; a version that arrives later is met at saving.
  const [opened] = useState({ fields: kiln.fields, version: kiln.version });
  const [from, setFrom] = useState(opened.version);
  const save = (fields: KilnFields, version: number, release: () => void): void => {
    alter.mutate(
      { fields, from: version },
      {
        onSuccess: (altered) => {
          release();
          tell({ kind: 'done', text: `${altered.fields.name} is altered.` });
          void navigate(paths.kiln(kiln.id));
        },
      },
    );
  };
  const current = currentOf(alter.error);
  return (
    <KilnForm
      initial={opened.fields}
      saveWords="Save the kiln"
      isSaving={alter.isPending}
      error={alter.error}
      onSave={(fields, release) => save(fields, from, release)}
      refusal={(take, mine) =>
        current && (
          <Notice
            kind="caution"
            heading="This kiln was altered elsewhere since you opened it"
            appeared
            action={
              <>
                <Button
                  onClick={() => {
                    setFrom(current.version);
                    alter.reset();
                  }}
                >
                  Keep mine, then save again
                </Button>
                <Button
                  onClick={() => {
                    take(current.fields);
                    setFrom(current.version);
                    alter.reset();
                  }}
                >
                  Take theirs
                </Button>
              </>
            }
          >
            Nothing is lost: yours stands above, theirs is saved as version {current.version}. They
            differ in: {differingLabels(mine, current.fields).join(', ') || 'nothing'}.
          </Notice>
        )
      }
    />
  );
}
