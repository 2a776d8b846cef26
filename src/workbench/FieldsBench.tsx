import { useState } from 'react';
import { FLAMES, FUELS, PRIMARY_AIR } from '#shared/vocabulary/kiln.ts';
import type { Fuel } from '#shared/vocabulary/kiln.ts';
import { SURFACE_FAULTS } from '#shared/vocabulary/ware.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { Button } from '../ui/Button.tsx';
import { CheckField } from '../ui/CheckField.tsx';
import { ChoiceField } from '../ui/ChoiceField.tsx';
import { DateField } from '../ui/DateField.tsx';
import { Fieldset } from '../ui/Fieldset.tsx';
import { ManyChoiceField } from '../ui/ManyChoiceField.tsx';
import { NumberField } from '../ui/NumberField.tsx';
import { optionsOf } from '../ui/options.ts';
import { SelectField } from '../ui/SelectField.tsx';
import { TemperatureField } from '../ui/TemperatureField.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { TextField } from '../ui/TextField.tsx';
import { TimeField } from '../ui/TimeField.tsx';
import { Bench } from './Bench.tsx';

export function FieldsBench() {
  const [title, setTitle] = useState('Level at 708 until the floor stopped drinking the heat');
  const [fuel, setFuel] = useState<Fuel | null>('propane');
  const [air, setAir] = useState<keyof typeof PRIMARY_AIR | null>('part');
  const [flame, setFlame] = useState<keyof typeof FLAMES | null>(null);
  const [target, setTarget] = useState<number | null>(1005);
  const [unit, setUnit] = useState<TemperatureUnit>('C');
  const [setback, setSetback] = useState<number | null>(-20);
  const [faults, setFaults] = useState<readonly (keyof typeof SURFACE_FAULTS)[]>(['pinholes']);
  const [story, setStory] = useState('The slab under the kiln was too hot to keep a hand on.');
  const [read, setRead] = useState(false);
  const [date, setDate] = useState('2026-09-14');
  const [time, setTime] = useState('15:40');
  return (
    <Bench title="Fields">
      <Fieldset legend="Plan" lead="What you meant to do, before anything went its own way.">
        <TextField label="Title" value={title} onValue={setTitle} required />
        <DateField label="Fired on" value={date} onValue={setDate} required />
        <TimeField label="Lit at" value={time} onValue={setTime} />
        <TemperatureField
          label="Target"
          celsius={target}
          onCelsius={setTarget}
          unit={unit}
          minCelsius={400}
          maxCelsius={1150}
          issues={[
            {
              kind: 'look-again',
              text: 'The record peaks at 1006 °C, 31 °C above what you wrote. Which is right?',
            },
          ]}
        />
        <Button kind="quiet" onClick={() => setUnit(unit === 'C' ? 'F' : 'C')}>
          Show in °{unit === 'C' ? 'F' : 'C'}
        </Button>
        <NumberField
          label="Burner setback"
          value={setback}
          onValue={setSetback}
          unit="mm"
          min={-50}
          max={300}
          hint="From the outside of the wall; negative when the tip is inside the port."
        />
        <NumberField
          label="Pressure"
          value={7.5}
          onValue={() => undefined}
          unit="bar"
          min={0}
          max={4}
        />
        <NumberField label="Gas used" value={null} onValue={() => undefined} unit="kg" disabled />
        <SelectField
          label="Fuel"
          value={fuel}
          onValue={setFuel}
          options={optionsOf(FUELS)}
          required
        />
        <ChoiceField
          label="Primary air"
          value={air}
          onValue={setAir}
          options={optionsOf(PRIMARY_AIR)}
        />
        <ChoiceField
          label="Flame at the flue"
          value={flame}
          onValue={setFlame}
          options={optionsOf(FLAMES)}
          required
          issues={[{ kind: 'must-mend', text: 'Say what the flame looked like, or “None”.' }]}
        />
        <ManyChoiceField
          label="Surface faults"
          values={faults}
          onValues={setFaults}
          options={optionsOf(SURFACE_FAULTS)}
        />
        <TextArea label="What surprised you" value={story} onValue={setStory} maxLength={120} />
        <TextField
          label="Next time"
          value=""
          onValue={() => undefined}
          issues={[
            { kind: 'must-mend', text: 'Write a sentence: it is what the next reader looks for.' },
            { kind: 'look-again', text: 'You changed the floor during this firing.' },
          ]}
        />
        <CheckField
          label="I have read the cautions, and this note tells nobody to do otherwise."
          checked={read}
          onChecked={setRead}
          required
          hint="Opens the seven sentences again if you click the word."
        />
        <CheckField label="Lit by the ware" checked onChecked={() => undefined} disabled />
      </Fieldset>
      <div className="flex flex-wrap items-center gap-4">
        <Button kind="main">Hand in</Button>
        <Button kind="main" busy>
          Handing in
        </Button>
        <Button kind="main" disabled>
          Hand in
        </Button>
        <Button>Keep as draft</Button>
        <Button icon="copy">As the row above</Button>
        <Button busy>Saving</Button>
        <Button disabled>Keep as draft</Button>
        <Button kind="danger">Delete this draft</Button>
        <Button kind="danger" disabled>
          Delete this draft
        </Button>
        <Button kind="quiet">Show the row</Button>
      </div>
    </Bench>
  );
}
