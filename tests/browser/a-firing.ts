import { fire, type Climb } from '../../seeds/development/firings/climb.ts';

/** A logger's file as it comes off many of them: semicolons, a decimal comma, seconds of the day. */
function semicolonCsv(readings: readonly { minute: number; celsius: number }[]): string {
  const comma = (value: number): string => value.toFixed(1).replace('.', ',');
  const rows = readings.map(({ minute, celsius }) => `${comma(minute)};${comma(celsius)}`);
  return ['Minuten;Temperatur °C', ...rows].join('\r\n');
}

function logged(climb: Omit<Climb, 'by'>) {
  const { readings, shutOffMinute, peakCelsius, reachedMinute } = fire(
    { ...climb, by: 'logger-30' },
    { seed: 5, litres: 48, airCelsius: 15, targetCelsius: 1010 },
  );
  return { csv: semicolonCsv(readings), shutOffMinute, peakCelsius, reachedMinute };
}

/** Levels off at 700 °C for a quarter of an hour, and is given up. */
export const STALLED = logged({ level: 709, rate: 42, giveUp: 52 });
/** The next firing of the same kiln: all the way to 1010 °C and held there. */
export const CURED = logged({ reach: 32, hold: 4 });
