import { insideVolumeLitres } from '#shared/note/kiln-fields.ts';
import { KILN_LABELS } from '#shared/note/kiln-labels.ts';
import { formatChamber } from '#shared/units/volume.ts';
import {
  BURNER_KINDS,
  FLUE_PLACES,
  FUELS,
  OPENINGS,
  PROBES,
  SHAPES,
  WALLS,
} from '#shared/vocabulary/kiln.ts';
import { Fieldset } from '../ui/Fieldset.tsx';
import { optionsOf } from '../ui/options.ts';
import { Reading } from '../ui/Reading.tsx';
import { SelectField } from '../ui/SelectField.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { KilnChoice, KilnLine, KilnMeasure, type KilnFormPart } from './KilnField.tsx';

/** Four hundred names: asked for once. */
const ZONES = Intl.supportedValuesOf('timeZone').map((value) => ({
  value,
  label: value.replace(/_/g, ' '),
}));

/** Every field of a kiln, those that do not belong to its shape and wall left out. */
export function KilnFormFields({ form }: { readonly form: KilnFormPart }) {
  const { fields, change, units } = form;
  const litres = insideVolumeLitres(fields);
  const zone = fields.timeZone;
  const zoneOptions =
    zone === '' || ZONES.some(({ value }) => value === zone)
      ? ZONES
      : [{ value: zone, label: zone }, ...ZONES];
  return (
    <div className="space-y-8">
      <Fieldset legend="What it is">
        <KilnLine form={form} name="name" required maxLength={60} hint="As you call it." />
        <KilnChoice form={form} name="opening" terms={OPENINGS} />
        <KilnChoice form={form} name="shape" terms={SHAPES} />
      </Fieldset>
      <Fieldset legend="Inside" lead="Measured between the faces of the lining.">
        {fields.shape !== 'square' && <KilnMeasure form={form} name="insideDiameterMm" />}
        {fields.shape !== 'round' && (
          <>
            <KilnMeasure form={form} name="insideWidthMm" />
            <KilnMeasure form={form} name="insideDepthMm" />
          </>
        )}
        <KilnMeasure form={form} name="insideHeightMm" />
        <p className="border-t border-line py-2 text-small" aria-live="polite">
          {litres === null ? (
            <span className="text-soot-2">The volume is worked out from these.</span>
          ) : (
            <>
              Inside volume: <Reading>{formatChamber(litres, units)}</Reading>
            </>
          )}
        </p>
      </Fieldset>
      <Fieldset legend="Wall and lid">
        <KilnChoice form={form} name="wall" terms={WALLS} />
        {fields.wall !== 'brick' && (
          <>
            <KilnMeasure form={form} name="fibreThicknessMm" />
            <KilnMeasure form={form} name="fibreDensityKgM3" />
          </>
        )}
        {fields.wall !== 'fibre' && <KilnMeasure form={form} name="brickThicknessMm" />}
        <KilnLine
          form={form}
          name="lid"
          maxLength={120}
          hint="What it is made of and how it closes."
        />
      </Fieldset>
      <Fieldset legend="Flue, burner, fuel">
        <KilnChoice form={form} name="flue" terms={FLUE_PLACES} />
        <KilnMeasure form={form} name="flueOpeningMm" />
        <KilnMeasure form={form} name="burnerPortMm" />
        <KilnChoice form={form} name="burnerKind" terms={BURNER_KINDS} />
        <KilnMeasure form={form} name="burners" />
        <KilnLine form={form} name="jet" maxLength={40} hint="As it is stamped." />
        <KilnMeasure form={form} name="nominalKw" />
        <SelectField
          label={KILN_LABELS.fuel}
          required
          blank={null}
          options={optionsOf(FUELS)}
          value={fields.fuel}
          onValue={(fuel) => fuel !== null && change({ fuel })}
        />
      </Fieldset>
      <Fieldset legend="Measuring">
        <KilnChoice
          form={form}
          name="probe"
          terms={PROBES}
          hint="The type of thermocouple, as written on its plug or meter."
        />
        <SelectField
          label={KILN_LABELS.timeZone}
          hint="Firings are dated by the clock where the kiln stands."
          options={zoneOptions}
          value={zone === '' ? null : zone}
          onValue={(timeZone) => change({ timeZone: timeZone ?? '' })}
        />
        <TextArea
          label={KILN_LABELS.about}
          issues={form.issues.about}
          value={fields.about}
          onValue={(about) => change({ about })}
          maxLength={1000}
          rows={4}
        />
      </Fieldset>
    </div>
  );
}
