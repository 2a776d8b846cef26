import type { Probe } from '../vocabulary/kiln.ts';

/**
 * What new thermocouple wire of tolerance class 2 may be off at a temperature, ±°C, by
 * IEC 60584-2:1982 with amendment 1:1989 (carried into IEC 60584-1:2013): types K and N the larger
 * of 2.5 °C and 0.75 %, from −40 to 1200 °C; types R and S the larger of 1.5 °C and 0.25 %, from 0
 * to 1600 °C. `null` outside the class and for no probe. Meter, cold junction, age and placement
 * come on top, and placement can be tens of degrees.
 */
export function probeTolerance(probe: Probe | null | undefined, celsius: number): number | null {
  if (probe === 'K' || probe === 'N') {
    if (!(celsius >= -40 && celsius <= 1200)) return null;
    return Math.max(2.5, 0.0075 * Math.abs(celsius));
  }
  if (probe === 'R' || probe === 'S') {
    if (!(celsius >= 0 && celsius <= 1600)) return null;
    return Math.max(1.5, 0.0025 * celsius);
  }
  return null;
}
