import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { kilnSchema, type Kiln } from '#shared/api/kilns.ts';
import { kilnFieldsSchema, type KilnFields } from '#shared/note/kiln-fields.ts';
import { KILN_LABELS } from '#shared/note/kiln-labels.ts';
import { KILN_RANGES, rangeAt } from '#shared/note/ranges.ts';
import { FUELS, OPENINGS, PROBES, SHAPES, WALLS } from '#shared/vocabulary/kiln.ts';
import { useSession } from '../accounts/useSession.ts';
import { newIdempotencyKey, send } from '../http/client.ts';
import { Button } from '../ui/Button.tsx';
import { ChoiceField } from '../ui/ChoiceField.tsx';
import { Fieldset } from '../ui/Fieldset.tsx';
import { Notice } from '../ui/Notice.tsx';
import { NumberField } from '../ui/NumberField.tsx';
import { optionsOf } from '../ui/options.ts';
import { SelectField } from '../ui/SelectField.tsx';
import { TextField } from '../ui/TextField.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { shownUnit } from './measure-units.ts';

const ZONE = Intl.DateTimeFormat().resolvedOptions().timeZone;

function addKiln(fields: KilnFields, key: string): Promise<Kiln> {
  return send({
    method: 'POST',
    path: '/api/kilns',
    body: { fields },
    headers: { 'Idempotency-Key': key },
    answer: kilnSchema,
  });
}

/** The first description of a kiln: what a firing in it needs. The rest is added on its own page. */
export function DescribeKiln(props: {
  readonly onMade: (kiln: Kiln) => void;
  readonly onCancel: () => void;
}) {
  const tell = useMessages();
  const client = useQueryClient();
  const [key] = useState(newIdempotencyKey);
  const [asked, setAsked] = useState(false);
  const [kiln, setKiln] = useState<KilnFields>(() => ({
    ...kilnFieldsSchema.parse({ name: 'new', fuel: 'propane', timeZone: ZONE }),
    name: '',
  }));
  const add = useMutation({
    mutationFn: () => addKiln(kiln, key),
    onSuccess: async (made) => {
      tell({ kind: 'done', text: `“${made.fields.name}” is described.` });
      await client.invalidateQueries({ queryKey: ['kilns'] });
      props.onMade(made);
    },
  });
  const at = <Name extends keyof KilnFields>(name: Name) => ({
    label: KILN_LABELS[name],
    value: kiln[name],
    onValue: (value: KilnFields[Name]) => setKiln((now) => ({ ...now, [name]: value })),
  });
  const isNameless = kiln.name.trim() === '';
  return (
    <Fieldset
      legend="A new kiln"
      lead="Described once and used for all its firings. Flue, burner and all the rest you can add on its own page."
    >
      <TextField
        {...at('name')}
        required
        maxLength={60}
        issues={asked && isNameless ? [{ kind: 'must-mend', text: 'Give the kiln a name.' }] : []}
      />
      <SelectField
        {...at('fuel')}
        required
        blank={null}
        options={optionsOf(FUELS)}
        onValue={(fuel) => fuel && setKiln((now) => ({ ...now, fuel }))}
      />
      <ChoiceField {...at('opening')} options={optionsOf(OPENINGS)} />
      <ChoiceField {...at('shape')} options={optionsOf(SHAPES)} />
      {kiln.shape === 'round' && <Size name="insideDiameterMm" {...{ kiln, setKiln }} />}
      {kiln.shape === 'square' && (
        <>
          <Size name="insideWidthMm" {...{ kiln, setKiln }} />
          <Size name="insideDepthMm" {...{ kiln, setKiln }} />
        </>
      )}
      {kiln.shape !== null && <Size name="insideHeightMm" {...{ kiln, setKiln }} />}
      <ChoiceField {...at('wall')} options={optionsOf(WALLS)} />
      {kiln.wall === 'fibre' && <Size name="fibreThicknessMm" {...{ kiln, setKiln }} />}
      {kiln.wall === 'brick' && <Size name="brickThicknessMm" {...{ kiln, setKiln }} />}
      <ChoiceField {...at('probe')} options={optionsOf(PROBES)} />
      {add.isError && (
        <Notice kind="error" heading="The kiln is not stored" appeared>
          {add.error.message}
        </Notice>
      )}
      <div className="flex flex-wrap gap-3 py-3">
        <Button
          kind="main"
          busy={add.isPending}
          onClick={() => {
            setAsked(true);
            if (!isNameless) add.mutate();
          }}
        >
          Use this kiln
        </Button>
        <Button onClick={props.onCancel}>Cancel</Button>
      </div>
    </Fieldset>
  );
}

type SizeName = {
  [Name in keyof KilnFields]: KilnFields[Name] extends number | null ? Name : never;
}[keyof KilnFields];

function Size(props: {
  readonly name: SizeName;
  readonly kiln: KilnFields;
  readonly setKiln: (update: (kiln: KilnFields) => KilnFields) => void;
}) {
  const { name, kiln, setKiln } = props;
  const { units } = useSession();
  const range = rangeAt(`/${name}`, KILN_RANGES);
  const shown = shownUnit(range?.unit ?? '', units);
  const bound = (limit: number) => Math.round(shown.toShown(limit) * 10) / 10;
  return (
    <NumberField
      label={KILN_LABELS[name]}
      value={kiln[name]}
      onValue={(value) => setKiln((now) => ({ ...now, [name]: value }))}
      unit={shown.unit}
      min={range ? bound(range.range[0]) : undefined}
      max={range ? bound(range.range[1]) : undefined}
      decimals={shown.decimals}
      toShown={shown.toShown}
      toStored={shown.toStored}
    />
  );
}
