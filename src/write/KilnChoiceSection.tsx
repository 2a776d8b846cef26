import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { paths } from '#shared/paths.ts';
import { formatChamber } from '#shared/units/volume.ts';
import { FUELS, WALLS } from '#shared/vocabulary/kiln.ts';
import { Button } from '../ui/Button.tsx';
import { IssueList } from '../ui/IssueList.tsx';
import { SelectField } from '../ui/SelectField.tsx';
import { DescribeKiln } from './DescribeKiln.tsx';
import { useWriteForm } from './form-context.ts';
import { PinnedField } from './PinnedField.tsx';
import { WriteSection } from './WriteSection.tsx';

/** The kiln that was fired: one of the member's, one lent to them, or a new one. */
export function KilnChoiceSection() {
  const { fields, change, kilns, kiln, units, issuesAt, marginAt } = useWriteForm();
  const [describing, setDescribing] = useState(false);
  const choose = (next: { id: number; fields: KilnFields } | null): void =>
    change((now) => ({
      ...now,
      kilnId: next?.id ?? null,
      when: { ...now.when, timeZone: next?.fields.timeZone || now.when.timeZone },
    }));
  const known = kilns.some(({ id }) => id === fields.kilnId);
  const options = [
    ...kilns.map((each) => ({
      value: String(each.id),
      label: nameWithKeeper(each.fields.name, each),
    })),
    // Lent no longer, or out of use: the draft keeps it, nobody can choose it anew.
    ...(fields.kilnId !== null && !known
      ? [{ value: String(fields.kilnId), label: kiln?.fields.name ?? 'The kiln chosen before' }]
      : []),
  ];
  const facts = kiln && [
    kiln.volumeLitres === null ? null : formatChamber(kiln.volumeLitres, units),
    kiln.fields.wall === null ? null : WALLS[kiln.fields.wall].toLowerCase(),
    FUELS[kiln.fields.fuel].toLowerCase(),
    probeWords(kiln.fields.probe),
  ];
  return (
    <WriteSection
      id="kiln"
      title="Kiln"
      lead="The note keeps the kiln as it is described now, even if it is altered later."
    >
      {options.length > 0 && (
        <PinnedField pointer="/kilnId">
          <SelectField
            label="Fired in"
            required
            value={fields.kilnId === null ? null : String(fields.kilnId)}
            onValue={(id) => choose(kilns.find((each) => String(each.id) === id) ?? null)}
            options={options}
            issues={issuesAt('/kilnId')}
            margin={marginAt('/kilnId')}
            hint={facts?.filter((fact) => fact !== null).join(', ')}
          />
        </PinnedField>
      )}
      {options.length === 0 && <IssueList issues={issuesAt('/kilnId')} />}
      {describing ? (
        <DescribeKiln
          onMade={(made) => {
            setDescribing(false);
            choose(made);
          }}
          onCancel={() => setDescribing(false)}
        />
      ) : (
        <p className="flex flex-wrap items-center gap-x-6 gap-y-2 pt-1">
          <Button
            icon="add"
            kind={options.length === 0 ? 'main' : 'plain'}
            onClick={() => setDescribing(true)}
          >
            Describe a new kiln
          </Button>
          {kiln && (
            <Link className="link text-small" to={paths.kiln(kiln.id)}>
              {kiln.fields.name}, its page
            </Link>
          )}
        </p>
      )}
    </WriteSection>
  );
}

/** Not said is not none. */
function probeWords(probe: KilnFields['probe']): string | null {
  if (probe === null) return null;
  return probe === 'none' ? 'no probe' : `type ${probe} probe`;
}

function nameWithKeeper(
  name: string,
  kiln: { keeper: { name: string } | null; abilities: { edit: boolean } },
): string {
  return kiln.abilities.edit || !kiln.keeper ? name : `${name} (lent by ${kiln.keeper.name})`;
}
