import { roundTo } from '#shared/units/number.ts';
import { fromCelsius, toCelsius } from '#shared/units/temperature.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import type { FieldProps } from './field-issue.ts';
import { NumberField } from './NumberField.tsx';

interface Props extends FieldProps {
  readonly celsius: number | null;
  readonly onCelsius: (celsius: number | null) => void;
  /** The unit it is typed and shown in; °C is stored either way. */
  readonly unit: TemperatureUnit;
  readonly minCelsius?: number;
  readonly maxCelsius?: number;
}

export function TemperatureField(props: Props) {
  const { celsius, onCelsius, unit, minCelsius, maxCelsius, ...field } = props;
  const bound = (limit: number | undefined) =>
    limit === undefined ? undefined : roundTo(fromCelsius(limit, unit));
  return (
    <NumberField
      // Another unit is another field: a half-typed text must not change its meaning.
      key={unit}
      {...field}
      value={celsius}
      onValue={onCelsius}
      unit={`°${unit}`}
      min={bound(minCelsius)}
      max={bound(maxCelsius)}
      decimals={1}
      toShown={(stored) => fromCelsius(stored, unit)}
      toStored={(shown) => toCelsius(shown, unit)}
    />
  );
}
