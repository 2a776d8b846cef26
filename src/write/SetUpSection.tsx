import type { ReactNode } from 'react';
import type { SetUp } from '#shared/note/set-up.ts';
import {
  FLAMES,
  PRIMARY_AIR,
  SHELF_KINDS,
  STANDS_ON,
  WEATHERS,
  WIND_SHELTERS,
  WINDS,
} from '#shared/vocabulary/kiln.ts';
import { DateField } from '../ui/DateField.tsx';
import { FoldedGroup } from './FoldedGroup.tsx';
import { Line, Measure, OneOf, YesNo } from './GroupFields.tsx';
import { useGroupField, useWriteForm } from './form-context.ts';
import { PinnedField } from './PinnedField.tsx';
import { WriteSection } from './WriteSection.tsx';

const BURNER: readonly (keyof SetUp)[] = [
  'burnerAngleDegrees',
  'burnerSetbackMm',
  'primaryAir',
  'regulatorBar',
  'cylinderKg',
  'gasUsedKg',
  'flameAtFlue',
  'flameAtSpyhole',
  'flueCoverPercent',
  'lidGapMm',
  'inFlamePath',
];
const FLOOR: readonly (keyof SetUp)[] = [
  'standsOn',
  'fibreBeneath',
  'baseLayers',
  'shelfKind',
  'shelfThicknessMm',
  'shelfHeightMm',
  'shelfFloorSharePercent',
  'loadPieces',
  'loadKg',
];
const WEATHER: readonly (keyof SetUp)[] = [
  'windShelter',
  'wind',
  'weather',
  'airCelsius',
  'kilnDamp',
  'probeDepthMm',
  'probeFromFlameMm',
  'probeFromWareMm',
  'probeCheckedOn',
];

/** How the kiln was set up for this firing. Everything may stay blank; blank is not zero. */
export function SetUpSection() {
  return (
    <WriteSection
      id="set-up"
      title="Set-up of this firing"
      lead="Fill in what you know. What differs from the firing before is proposed to you as a change; what is blank proposes nothing."
    >
      <Group title="Burner, gas and flue" names={BURNER}>
        <Measure
          group="setUp"
          name="burnerAngleDegrees"
          label="Burner to the wall"
          hint="90° aims straight in; smaller sweeps round the wall. 0 to 90°."
        />
        <Measure
          group="setUp"
          name="burnerSetbackMm"
          label="Burner setback"
          hint="From the port to the tip; negative when the tip is inside the port."
        />
        <OneOf group="setUp" name="primaryAir" label="Primary air" terms={PRIMARY_AIR} />
        <Measure group="setUp" name="regulatorBar" label="Regulator" />
        <Measure group="setUp" name="cylinderKg" label="Cylinder" />
        <Measure group="setUp" name="gasUsedKg" label="Gas used" />
        <OneOf group="setUp" name="flameAtFlue" label="Flame at the flue" terms={FLAMES} />
        <OneOf group="setUp" name="flameAtSpyhole" label="Flame at the spyhole" terms={FLAMES} />
        <Measure
          group="setUp"
          name="flueCoverPercent"
          label="Flue covered"
          hint="The largest cover during the climb. 0 is fully open."
        />
        <Measure group="setUp" name="lidGapMm" label="Gap at the lid" hint="0 is shut tight." />
        <Line group="setUp" name="inFlamePath" label="In the flame’s path" maxLength={200} />
      </Group>
      <Group title="Floor, shelf and load" names={FLOOR}>
        <OneOf group="setUp" name="standsOn" label="Kiln stands on" terms={STANDS_ON} />
        <YesNo group="setUp" name="fibreBeneath" label="Fibre in between" />
        <Line group="setUp" name="baseLayers" label="Layers of the base" maxLength={200} />
        <OneOf group="setUp" name="shelfKind" label="Shelf" terms={SHELF_KINDS} />
        <Measure group="setUp" name="shelfThicknessMm" label="Shelf thickness" />
        <Measure group="setUp" name="shelfHeightMm" label="Shelf on posts of" />
        <Measure group="setUp" name="shelfFloorSharePercent" label="Covers of the floor" />
        <Measure group="setUp" name="loadPieces" label="Pieces in the kiln" />
        <Measure group="setUp" name="loadKg" label="Weight of the load" />
      </Group>
      <Group title="Wind, weather and probe" names={WEATHER}>
        <OneOf group="setUp" name="windShelter" label="Wind shelter" terms={WIND_SHELTERS} />
        <OneOf group="setUp" name="wind" label="Wind" terms={WINDS} />
        <OneOf group="setUp" name="weather" label="Weather" terms={WEATHERS} />
        <Measure group="setUp" name="airCelsius" label="Air" />
        <YesNo group="setUp" name="kilnDamp" label="Kiln damp" />
        <Measure group="setUp" name="probeDepthMm" label="Probe inside by" />
        <Measure group="setUp" name="probeFromFlameMm" label="Probe from the flame" />
        <Measure group="setUp" name="probeFromWareMm" label="Probe from the ware" />
        <ProbeChecked />
      </Group>
    </WriteSection>
  );
}

function Group(props: {
  readonly title: string;
  readonly names: readonly (keyof SetUp)[];
  readonly children: ReactNode;
}) {
  const { fields, issuesAt, draft } = useWriteForm();
  const filled = props.names.filter((name) => {
    const value = fields.setUp[name];
    return value !== null && value !== '';
  }).length;
  const asks = props.names.some(
    (name) =>
      issuesAt(`/setUp/${name}`).length > 0 ||
      draft.remarks.some(({ pointer }) => pointer === `/setUp/${name}`),
  );
  return (
    <FoldedGroup title={props.title} filled={filled} of={props.names.length} asks={asks}>
      {props.children}
    </FoldedGroup>
  );
}

function ProbeChecked() {
  const { value, set, ...field } = useGroupField('setUp', 'probeCheckedOn');
  return (
    <PinnedField pointer="/setUp/probeCheckedOn">
      <DateField
        label="Probe last checked"
        {...field}
        value={value ?? ''}
        onValue={(next) => set(next || null)}
      />
    </PinnedField>
  );
}
