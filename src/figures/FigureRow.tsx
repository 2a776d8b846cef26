import type { FigureGroup, TopicFigures } from '#shared/api/figure-topics.ts';
import type { Units } from '#shared/units/units.ts';
import { IntervalBar } from '../ui/IntervalBar.tsx';
import { SHARE_COLUMNS } from '../ui/share-columns.ts';
import { countWords, quantityWords } from './figure-words.ts';
import { PointsPlot } from './PointsPlot.tsx';

interface Props {
  readonly figures: TopicFigures;
  readonly group: FigureGroup;
  readonly label: string;
  readonly units: Units;
}

/** One group: a share with its interval and each member's own, or numbers with their quartiles. */
export function FigureRow({ figures, group, label, units }: Props) {
  const counts = countWords(figures.topic, group);
  const { share, numbers } = group;
  if (share) {
    return (
      <li className="border-b border-line [&>div:first-child]:border-b-0">
        <IntervalBar
          label={label}
          count={share.count}
          of={share.of}
          interval={share.interval}
          aside={counts}
        />
        <div aria-hidden="true" className={`-mt-2 grid gap-x-6 pb-2 ${SHARE_COLUMNS}`}>
          <div className="px-1 sm:col-start-2">
            <MemberTicks members={share.byMember} />
          </div>
        </div>
      </li>
    );
  }
  const { quantity, domain } = figures;
  if (!numbers || quantity === null || domain === null) return null;
  const say = (value: number): string => quantityWords(value, quantity, units);
  const { q1, median, q3, interval } = numbers;
  const box = q1 === null || median === null || q3 === null ? null : { q1, median, q3, interval };
  const words = box
    ? `median ${say(box.median)}, half of them from ${say(box.q1)} to ${say(box.q3)}`
    : 'too few to say';
  return (
    <li
      className={`grid items-center gap-x-6 gap-y-1 border-b border-line py-2.5 text-small ${SHARE_COLUMNS}`}
    >
      <p className="font-[550]">{label}</p>
      <div className="px-1">
        <PointsPlot
          spread={numbers.spread}
          low={domain.low}
          high={domain.high}
          box={box}
          label={`${label}: ${words}; ${counts}`}
        />
      </div>
      <p aria-hidden="true" className="flex flex-col">
        {box ? (
          <>
            <span className="reading font-[500]">{say(box.median)}</span>
            <span className="text-soot-2">
              half from <span className="reading">{say(box.q1)}</span> to{' '}
              <span className="reading">{say(box.q3)}</span>
            </span>
            {interval && (
              <span className="text-soot-2">
                median’s 95&nbsp;%: <span className="reading">{say(interval.low)}</span> to{' '}
                <span className="reading">{say(interval.high)}</span>
              </span>
            )}
          </>
        ) : (
          <span className="text-soot-2">{words}</span>
        )}
        <span className="text-soot-2">{counts}</span>
      </p>
    </li>
  );
}

interface MemberTicksProps {
  readonly members: readonly { readonly count: number; readonly of: number }[];
}

/** A tick for each member's own share: whether one of them decides. */
function MemberTicks({ members }: MemberTicksProps) {
  const at = (share: number): string => `${(share * 100).toFixed(2)}%`;
  return (
    <svg className="ink-drawing block h-2 w-full overflow-visible">
      {members.map(({ count, of }, index) => (
        <line
          key={index}
          className="stroke-soot-2"
          strokeWidth="1.5"
          strokeOpacity="0.6"
          x1={at(count / of)}
          x2={at(count / of)}
          y1="0"
          y2="7"
        />
      ))}
    </svg>
  );
}
