import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { NumberField } from '../../../src/ui/NumberField.tsx';
import { TemperatureField } from '../../../src/ui/TemperatureField.tsx';
import type { TemperatureUnit } from '#shared/units/temperature.ts';

function Kept({ start = null }: { readonly start?: number | null }) {
  const [value, setValue] = useState<number | null>(start);
  return (
    <>
      <NumberField label="Setback" value={value} onValue={setValue} unit="mm" min={-50} max={300} />
      <output>{JSON.stringify(value)}</output>
    </>
  );
}

function Target({ unit }: { readonly unit: TemperatureUnit }) {
  const [celsius, setCelsius] = useState<number | null>(1010);
  return (
    <>
      <TemperatureField
        label="Target"
        celsius={celsius}
        onCelsius={setCelsius}
        unit={unit}
        minCelsius={400}
        maxCelsius={1150}
      />
      <output>{JSON.stringify(celsius)}</output>
    </>
  );
}

const field = () => screen.getByRole('textbox');
const kept = () => JSON.parse(screen.getByRole('status').textContent) as number | null;

describe('NumberField', () => {
  it('keeps the typist’s text while typing and tidies it on leaving', async () => {
    const user = userEvent.setup();
    render(<Kept />);
    await user.type(field(), '12,50');
    expect(field()).toHaveValue('12,50');
    expect(kept()).toBe(12.5);
    await user.tab();
    expect(field()).toHaveValue('12.5');
  });

  it('tells blank from nought', async () => {
    const user = userEvent.setup();
    render(<Kept start={7} />);
    await user.clear(field());
    expect(kept()).toBeNull();
    await user.type(field(), '0');
    expect(kept()).toBe(0);
  });

  it('keeps what it cannot read in sight, and says so once the field is left', async () => {
    const user = userEvent.setup();
    render(<Kept />);
    await user.type(field(), 'about 5');
    expect(field()).not.toBeInvalid();
    await user.tab();
    expect(field()).toHaveValue('about 5');
    expect(field()).toBeInvalid();
    expect(field()).toHaveAccessibleDescription(/Write a number/);
    expect(kept()).toBeNull();
  });

  it('says its range, and when a number lies outside it', async () => {
    const user = userEvent.setup();
    render(<Kept />);
    expect(field()).toHaveAccessibleDescription('−50 to 300\u00a0mm');
    await user.type(field(), '-60');
    await user.tab();
    expect(field()).toHaveAccessibleDescription(/Outside −50 to 300/);
  });

  it('ties given checks to the field: one that must be mended makes it invalid, another does not', () => {
    const look = { kind: 'look-again', text: 'The record peaks at 1006 °C.' } as const;
    const mend = { kind: 'must-mend', text: 'Needed for handing in.' } as const;
    const { rerender } = render(
      <NumberField label="Peak" value={975} onValue={() => undefined} issues={[look]} />,
    );
    expect(field()).not.toBeInvalid();
    expect(field()).toHaveAccessibleDescription(/Look again. The record peaks/);
    rerender(<NumberField label="Peak" value={975} onValue={() => undefined} issues={[mend]} />);
    expect(field()).toBeInvalid();
  });
});

describe('TemperatureField', () => {
  it('shows °F for °C, stores °C, and never rewrites what is typed', async () => {
    const user = userEvent.setup();
    render(<Target unit="F" />);
    expect(field()).toHaveValue('1850');
    await user.clear(field());
    await user.type(field(), '1839');
    expect(field()).toHaveValue('1839');
    expect(kept()).toBeCloseTo((1839 - 32) / 1.8, 9);
  });

  it('shows the stored temperature anew in another unit, without storing anything', () => {
    const { rerender } = render(<Target unit="C" />);
    expect(field()).toHaveValue('1010');
    rerender(<Target unit="F" />);
    expect(field()).toHaveValue('1850');
    expect(field()).toHaveAccessibleDescription('752 to 2102\u00a0°F');
    expect(kept()).toBe(1010);
  });
});
