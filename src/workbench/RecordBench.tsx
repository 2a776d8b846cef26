import { useState } from 'react';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { Button } from '../ui/Button.tsx';
import { FiringSheet } from '../ui/FiringSheet.tsx';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { KilnSection } from '../ui/KilnSection.tsx';
import { RecordChart } from '../ui/RecordChart.tsx';
import { Bench } from './Bench.tsx';
import {
  COMPARED,
  FIFTY_THOUSAND,
  GUST,
  HELD,
  SAGGED,
  SAG_AND_STALL,
  SECOND_PROBE,
  STALL,
  STALLED_MARKS,
  STALLED_THEN_WENT_ON,
} from './invented-records.ts';

export function RecordBench() {
  const [unit, setUnit] = useState<TemperatureUnit>('C');
  return (
    <>
      <Bench title="Record chart">
        <Button kind="quiet" onClick={() => setUnit(unit === 'C' ? 'F' : 'C')}>
          Show in °{unit === 'C' ? 'F' : 'C'}
        </Button>
        <RecordChart
          points={STALLED_THEN_WENT_ON}
          alt="Climbs to 708 °C in 29 min, stays there 17 min, goes on to 1006 °C in 61 min, held 5 min."
          targetCelsius={1005}
          hold={HELD}
          stretches={STALL}
          marks={STALLED_MARKS}
          secondProbe={SECOND_PROBE}
          unit={unit}
        />
        <HeatLegend unit={unit} />
        <RecordChart
          points={SAGGED}
          alt="Climbs to 715 °C in 31 min, falls to 688 °C, regains 716 °C and is given up."
          targetCelsius={1000}
          stretches={SAG_AND_STALL}
          marks={GUST}
          overlay={COMPARED}
          unit={unit}
        />
        <RecordChart points={FIFTY_THOUSAND} alt="Fifty thousand readings." unit={unit} />
        <RecordChart points={[]} alt="No record: fired by eye." />
      </Bench>
      <Bench title="Firing sheet">
        <FiringSheet
          blanks="dash"
          groups={[
            {
              heading: 'Climb',
              rows: [
                { label: 'Target', value: '1005\u00a0°C', reading: true },
                { label: 'To temperature', value: '58\u00a0min', reading: true },
                { label: 'Hold', value: '5\u00a0min ± 6\u00a0°C', reading: true },
                { label: 'Through 573', value: '2.4\u00a0min, 21\u00a0°C/min', reading: true },
                { label: 'Stall', value: '708\u00a0°C, 17\u00a0min', reading: true },
                { label: 'Drawn because', value: 'Glaze seen melted' },
              ],
            },
            {
              heading: 'Set-up',
              rows: [
                { label: 'Burner angle', value: '45°', reading: true },
                { label: 'Setback', value: '50\u00a0mm', reading: true },
                { label: 'Primary air', value: 'Part open' },
                { label: 'Stands on', value: 'Hollow block, fibre between' },
                { label: 'Gas used', value: null },
                { label: 'Pieces in the flame', value: 0, reading: true },
              ],
            },
            {
              heading: 'Reduction recipe',
              rows: [
                { label: 'Container', value: 'Steel bin, 38 litres' },
                { label: 'Combustible', value: 'Straw 6 l, sawdust 2 l' },
                { label: 'Lid off to covered', value: '14\u00a0s', reading: true },
                { label: 'Sealed with', value: 'Sand' },
                { label: 'Covered', value: '55\u00a0min', reading: true },
              ],
            },
          ]}
        />
      </Bench>
      <Bench title="Kiln section">
        <KilnSection
          kiln={{
            shape: 'round',
            insideWidthMm: 420,
            insideHeightMm: 520,
            wall: 'fibre',
            wallMm: 50,
            baseMm: 75,
            lidMm: 50,
            opening: 'lid',
            flue: { place: 'lid', openingMm: 110 },
            port: { openingMm: 75, centreHeightMm: 60 },
            burner: { angleDegrees: 45, setbackMm: 50 },
            shelf: { thicknessMm: 15, postsMm: 120, floorShare: 0.55 },
            standMm: 200,
          }}
        />
        <KilnSection
          kiln={{
            shape: 'square',
            insideWidthMm: 600,
            insideDepthMm: 450,
            insideHeightMm: 450,
            wall: 'brick',
            wallMm: 115,
            flue: { place: 'wall', openingMm: 100 },
            port: { openingMm: 90 },
            burner: { angleDegrees: 90, setbackMm: -20, count: 2 },
            shelf: { thicknessMm: 20, postsMm: 100 },
          }}
        />
        <KilnSection
          kiln={{
            shape: 'round',
            insideWidthMm: 300,
            insideHeightMm: 300,
            wall: 'fibre',
            wallMm: 25,
          }}
        />
      </Bench>
    </>
  );
}
