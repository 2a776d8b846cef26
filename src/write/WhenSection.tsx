import { memo } from 'react';
import { START_CLASSES } from '#shared/vocabulary/kiln.ts';
import { DateField } from '../ui/DateField.tsx';
import { SelectField } from '../ui/SelectField.tsx';
import { TimeField } from '../ui/TimeField.tsx';
import { Measure, OneOf } from './GroupFields.tsx';
import { useGroupField, useWriteForm, type WriteForm } from './form-context.ts';
import { PinnedField } from './PinnedField.tsx';
import { WriteSection } from './WriteSection.tsx';

const OWN_ZONE = Intl.DateTimeFormat().resolvedOptions().timeZone;
const ZONES: readonly string[] = Intl.supportedValuesOf('timeZone');

/** Day, hour, and how the kiln stood at the start. */
export function WhenSection() {
  const { draft, change } = useWriteForm();
  const { value: date, set: _set, ...dateField } = useGroupField('when', 'date');
  const { value: time, set: setTime, ...timeField } = useGroupField('when', 'startTime');
  return (
    <WriteSection id="when" title="When">
      <PinnedField pointer="/when/date">
        <DateField
          label="Day"
          required
          {...dateField}
          value={date ?? ''}
          onValue={(next) =>
            change((now) => ({
              ...now,
              // A day is a day somewhere: without a kiln's time zone, where this browser is.
              when: { ...now.when, date: next || null, timeZone: now.when.timeZone || OWN_ZONE },
            }))
          }
        />
      </PinnedField>
      <PinnedField pointer="/when/startTime">
        <TimeField
          label="Lit at"
          hint="Roughly is enough: it puts the firings of one day in order."
          required
          {...timeField}
          value={time ?? ''}
          onValue={(next) => setTime(next || null)}
        />
      </PinnedField>
      <TimeZone />
      <OneOf group="when" name="startClass" label="Kiln" terms={START_CLASSES} required />
      <Measure group="when" name="startCelsius" label="Its temperature" hint="If you know it." />
      <Measure
        group="when"
        name="unreportedFirings"
        label="Firings without a note"
        required={draft.earlier !== null}
        hint="Firings of this kiln since the last one written up that nobody wrote up. None is 0."
      />
    </WriteSection>
  );
}

/** Four hundred zones are not drawn anew with every key typed beside them. */
const ZoneField = memo(function ZoneField(props: {
  readonly zone: string;
  readonly change: WriteForm['change'];
  readonly disabled: boolean;
}) {
  const names = [...new Set([OWN_ZONE, props.zone, ...ZONES])].filter((name) => name !== '');
  return (
    <SelectField
      label="Time zone of the kiln"
      disabled={props.disabled}
      value={props.zone || null}
      onValue={(next) =>
        props.change((now) => ({ ...now, when: { ...now.when, timeZone: next ?? '' } }))
      }
      options={names.map((name) => ({ value: name, label: name.replace(/_/g, ' ') }))}
    />
  );
});

function TimeZone() {
  const { fields, change, editable } = useWriteForm();
  return (
    <PinnedField pointer="/when/timeZone">
      <ZoneField zone={fields.when.timeZone} change={change} disabled={!editable} />
    </PinnedField>
  );
}
