import { GAS_FUELS } from '../vocabulary/kiln.ts';
import type { Fuel } from '../vocabulary/kiln.ts';

/**
 * Lower heating value of propane gas at 25 °C, MJ/kg: 2043.9 kJ/mol over 44.0956 g/mol, from the
 * formation enthalpies of the CRC Handbook with water as vapour. Lower, because a kiln's flue lets
 * the water go as vapour.
 */
export const PROPANE_MEGAJOULES_PER_KG = 46.35;

export interface GasUse {
  readonly megajoules: number;
  /** Per litre of the kiln's inside. */
  readonly megajoulesPerLitre: number | null;
  /** Per kilogram of ware. */
  readonly megajoulesPerKgOfWare: number | null;
}

/**
 * Heat in the gas burned. Only where the gas is sold by weight as propane or LPG (mixed and butane
 * within two per cent of propane); null for other fuels and for an unknown weight.
 */
export function gasUse(
  fuel: Fuel | null | undefined,
  gasKg: number | null | undefined,
  kilnLitres?: number | null,
  wareKg?: number | null,
): GasUse | null {
  if (fuel == null || !GAS_FUELS.includes(fuel) || fuel === 'natural-gas') return null;
  if (gasKg == null || !(gasKg >= 0) || !Number.isFinite(gasKg)) return null;
  const megajoules = gasKg * PROPANE_MEGAJOULES_PER_KG;
  return {
    megajoules,
    megajoulesPerLitre: perUnit(megajoules, kilnLitres),
    megajoulesPerKgOfWare: perUnit(megajoules, wareKg),
  };
}

function perUnit(amount: number, size: number | null | undefined): number | null {
  return size != null && size > 0 && Number.isFinite(size) ? amount / size : null;
}
