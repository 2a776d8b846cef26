import type { WhatHelped } from '#shared/api/figures.ts';
import { formatDifference } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { IntervalBar } from '../ui/IntervalBar.tsx';
import { ShareScale } from '../ui/ShareScale.tsx';
import { ChangeCaution } from './ChangeCaution.tsx';
import { START_WORDS } from './helped-words.ts';
import { NotesBehind } from './NotesBehind.tsx';

interface Props {
  readonly helped: WhatHelped;
  readonly units: Units;
}

/** A stall has gone on when the curve stands so much higher within 20 minutes. */
const WENT_ON_CELSIUS = 50;

/** What was done at a stall while it lasted, and how often the kiln then went on climbing. */
export function DuringTheFiring({ helped, units }: Props) {
  if (helped.trouble !== 'stall') return null;
  const rows = helped.duringTheFiring;
  return (
    <section id="during" tabIndex={-1} aria-labelledby="during-title" className="space-y-4">
      <div className="space-y-1">
        <h2 id="during-title" className="text-section">
          During the firing
        </h2>
        <p className="max-w-measure text-small text-soot-2">
          What was done in the last ten minutes of a stall or at its end, and how often the kiln
          then stood {formatDifference(WENT_ON_CELSIUS, units.temperature)} higher within 20
          minutes. Never mixed with what was changed for the next firing.
        </p>
      </div>
      {rows.length === 0 && (
        <p className="text-small">No published stall tells what came of it yet.</p>
      )}
      {(['cold', 'hot'] as const).map((startClass) => {
        const own = rows.filter((row) => row.startClass === startClass);
        if (own.length === 0) return null;
        return (
          <div key={startClass}>
            <ShareScale heading={`${START_WORDS[startClass]}: done at the stall, then went on`} />
            <ul>
              {own.map((row) => (
                <li
                  key={row.change}
                  className="border-b border-line pb-2 [&>div:first-child]:border-b-0"
                >
                  <IntervalBar
                    label={row.change}
                    count={row.wentOn}
                    of={row.firings}
                    interval={row.interval}
                    aside={row.members === 1 ? '1 member' : `${String(row.members)} members`}
                  />
                  <ChangeCaution caution={row.caution} />
                  <NotesBehind noteIds={row.noteIds} notes={helped.notes} of={row.change} />
                </li>
              ))}
            </ul>
          </div>
        );
      })}
    </section>
  );
}
