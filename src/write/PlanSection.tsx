import { KNOWN_BY } from '#shared/note/plan.ts';
import { formatDifference } from '#shared/units/temperature.ts';
import { DRAWN_BECAUSE } from '#shared/vocabulary/kiln.ts';
import { CheckField } from '../ui/CheckField.tsx';
import { MeasureAt } from './FieldsAt.tsx';
import { Line, Measure, OneOf } from './GroupFields.tsx';
import { useGroupField, useWriteForm } from './form-context.ts';
import { PinnedField } from './PinnedField.tsx';
import { WriteSection } from './WriteSection.tsx';

/** What was aimed at and what came of it. */
export function PlanSection() {
  const { fields, reading, units } = useWriteForm();
  const { plan } = fields;
  const hasRecord = reading.reading !== null;
  return (
    <WriteSection
      id="plan"
      title="Plan, and what came of it"
      lead={
        hasRecord
          ? 'Peak, time and hold are read off your record; what you type here is compared with it.'
          : 'With a record, peak, time and hold are read off it and may stay blank here.'
      }
    >
      <OneOf
        group="plan"
        name="drawnBecause"
        label="Drawn because"
        terms={DRAWN_BECAUSE}
        required
      />
      <OneOf group="plan" name="targetBy" label="Target known by" terms={KNOWN_BY} required />
      {plan.targetBy === 'temperature' && <Degrees name="targetCelsius" label="Target" required />}
      {plan.targetBy === 'cone' && (
        <Line group="plan" name="targetCone" label="Target cone" maxLength={8} required />
      )}
      <OneOf
        group="plan"
        name="peakBy"
        label="Peak known by"
        terms={KNOWN_BY}
        required={!hasRecord}
      />
      {plan.peakBy === 'temperature' && <Degrees name="peakCelsius" label="Peak" required />}
      {plan.peakBy === 'cone' && (
        <Line group="plan" name="peakCone" label="Cone it came to" maxLength={8} required />
      )}
      <Measure
        group="plan"
        name="timeToTemperatureMinutes"
        label="Time to temperature"
        required={!hasRecord}
        hint={`From lighting to within ${formatDifference(5, units.temperature)} of the target.`}
      />
      <NoHold />
      {!plan.noHold && (
        <>
          <Measure group="plan" name="holdPlannedMinutes" label="Hold planned" />
          <Measure group="plan" name="holdKeptMinutes" label="Hold kept" required={!hasRecord} />
        </>
      )}
    </WriteSection>
  );
}

/** A temperature of the plan. The unit it was typed in is kept: 1850 typed as °C is asked about. */
function Degrees(props: {
  readonly name: 'targetCelsius' | 'peakCelsius';
  readonly label: string;
  readonly required?: boolean;
}) {
  const { name, ...field } = props;
  const { fields, change, units } = useWriteForm();
  return (
    <MeasureAt
      {...field}
      pointer={`/plan/${name}`}
      value={fields.plan[name]}
      onValue={(celsius) =>
        change((now) => ({
          ...now,
          plan: { ...now.plan, [name]: celsius, typedIn: units.temperature },
        }))
      }
    />
  );
}

function NoHold() {
  const { value, set, ...field } = useGroupField('plan', 'noHold');
  const { issuesAt } = useWriteForm();
  // Without a hold its field is not there, and what is asked about it is asked here.
  const issues = value ? [...field.issues, ...issuesAt('/plan/holdKeptMinutes')] : field.issues;
  return (
    <PinnedField pointer="/plan/noHold">
      <div className="@2xl:pl-[11.75rem]">
        <CheckField
          {...field}
          issues={issues}
          label="No hold: drawn or shut off as soon as it was there"
          checked={value}
          onChecked={set}
        />
      </div>
    </PinnedField>
  );
}
