import { NO_BREAK_SPACE } from '../units/units.ts';
import { FUELS } from '../vocabulary/kiln.ts';
import { BURNER_SHARE, FLUE_OPENING_MM, LINING_MM } from './change-thresholds.ts';
import { compareNumbers, compareShares, insteadOf } from './compare-fields.ts';
import type { KilnFields } from './kiln-fields.ts';
import type { ProposedChange } from './proposed-changes.ts';

const MM = `${NO_BREAK_SPACE}mm`;

/** What a new version of the kiln proposes. */
export function kilnChanges(before: KilnFields, now: KilnFields): ProposedChange[] {
  const jets = [before.jet.trim(), now.jet.trim()] as const;
  const kw = insteadOf(`${NO_BREAK_SPACE}kW`);
  const mm = insteadOf(MM);
  return [
    ...(jets[0] !== '' && jets[1] !== '' && jets[0].toLowerCase() !== jets[1].toLowerCase()
      ? [
          {
            change: 'jet-cleaned-or-changed' as const,
            text: `jet “${jets[1]}” instead of “${jets[0]}”`,
          },
        ]
      : []),
    ...compareShares(
      before.nominalKw,
      now.nominalKw,
      { share: BURNER_SHARE },
      { up: 'burner-bigger' },
      (a, b) => `burner of ${kw(a, b)}`,
    ),
    ...compareNumbers(
      before.burners,
      now.burners,
      1,
      { up: 'burner-added' },
      (a, b) => `${String(a)} burners instead of ${String(b)}`,
    ),
    ...(before.fuel !== now.fuel
      ? [
          {
            change: 'fuel-changed' as const,
            text: `${FUELS[now.fuel].toLowerCase()} instead of ${FUELS[before.fuel].toLowerCase()}`,
          },
        ]
      : []),
    ...compareNumbers(
      before.fibreThicknessMm,
      now.fibreThicknessMm,
      LINING_MM,
      { up: 'lining-thicker' },
      (a, b) => `fibre of ${mm(a, b)}`,
    ),
    ...compareNumbers(
      before.brickThicknessMm,
      now.brickThicknessMm,
      LINING_MM,
      { up: 'lining-thicker' },
      (a, b) => `brick of ${mm(a, b)}`,
    ),
    ...compareNumbers(
      before.flueOpeningMm,
      now.flueOpeningMm,
      FLUE_OPENING_MM,
      { up: 'flue-more-open', down: 'flue-more-covered' },
      (a, b) => `flue opening of ${mm(a, b)}`,
    ),
    ...(before.probe !== null && now.probe !== null && before.probe !== now.probe
      ? [
          {
            change: 'probe-moved-or-replaced' as const,
            text: `${probeWords(now.probe)} instead of ${probeWords(before.probe)}`,
          },
        ]
      : []),
  ];
}

const probeWords = (probe: NonNullable<KilnFields['probe']>): string =>
  probe === 'none' ? 'no probe' : `a type ${probe} probe`;
