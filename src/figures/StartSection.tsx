import type { TopicFigures } from '#shared/api/figure-topics.ts';
import type { Units } from '#shared/units/units.ts';
import { FIGURE_DIMENSIONS, FIGURE_TOPICS } from '#shared/vocabulary/figures.ts';
import { SHARE_COLUMNS } from '../ui/share-columns.ts';
import { ShareScale } from '../ui/ShareScale.tsx';
import { FigureRow } from './FigureRow.tsx';
import { FigureTable } from './FigureTable.tsx';
import {
  countWords,
  differenceWords,
  groupWords,
  OUTCOME_WORDS,
  quantityWords,
} from './figure-words.ts';
import { START_WORDS } from './helped-words.ts';
import { PointsPlot } from './PointsPlot.tsx';

interface Props {
  readonly figures: TopicFigures;
  readonly table: TopicFigures['tables'][number];
  readonly units: Units;
}

/** The groups of cold starts, or of hot ones. */
export function StartSection({ figures, table, units }: Props) {
  const { topic, by, groups, groupQuantity } = figures;
  const heading = `start-${table.startClass}`;
  const nameOf = (id: string): string => {
    const group = groups.find((each) => each.id === id);
    return group ? groupWords(group, groupQuantity, units) : id;
  };
  const what = `${FIGURE_TOPICS[topic]} by ${FIGURE_DIMENSIONS[by].toLowerCase()}`;
  return (
    <section aria-labelledby={heading} className="space-y-4">
      <div className="space-y-1">
        <h2 id={heading} className="text-section">
          {START_WORDS[table.startClass]}
        </h2>
        <p className="text-small text-soot-2">{countWords(topic, table)}.</p>
      </div>
      <div>
        {figures.quantity === null ? (
          <ShareScale heading={`${what}: share of pieces; a tick for each member`} />
        ) : (
          <NumberScale figures={figures} heading={what} units={units} />
        )}
        <ul>
          {table.groups.map((group) => (
            <FigureRow
              key={group.id}
              figures={figures}
              group={group}
              label={nameOf(group.id)}
              units={units}
            />
          ))}
        </ul>
      </div>
      <Comparison table={table} nameOf={nameOf} />
      <Along figures={figures} table={table} units={units} />
      <FigureTable
        figures={figures}
        table={table}
        caption={`${what}, ${START_WORDS[table.startClass].toLowerCase()}`}
        nameOf={nameOf}
        units={units}
      />
    </section>
  );
}

interface ScaleProps {
  readonly figures: TopicFigures;
  readonly heading: string;
  readonly units: Units;
}

function NumberScale({ figures: { domain, quantity }, heading, units }: ScaleProps) {
  if (domain === null || quantity === null) return null;
  return (
    <div
      className={`grid items-end gap-x-6 border-b border-soot py-1.5 text-note text-soot-2 ${SHARE_COLUMNS}`}
    >
      <span className="text-balance">{heading}: every point, and the quartiles</span>
      <span aria-hidden="true" className="flex justify-between px-1">
        <span className="reading">{quantityWords(domain.low, quantity, units)}</span>
        <span className="reading">{quantityWords(domain.high, quantity, units)}</span>
      </span>
    </div>
  );
}

interface ComparisonProps {
  readonly table: Props['table'];
  readonly nameOf: (id: string) => string;
}

/** Two groups held against each other, in a sentence. */
function Comparison({ table: { comparison }, nameOf }: ComparisonProps) {
  if (comparison === null || comparison.a === comparison.b) return null;
  const { a, b, difference } = comparison;
  const isClear = difference !== null && (difference.low > 0 || difference.high < 0);
  return (
    <p className="max-w-measure border-l-2 border-soot pl-4">
      <strong className="font-[650]">
        {nameOf(a)}, against {nameOf(b).replace(/^./, (first) => first.toLowerCase())}:
      </strong>{' '}
      {difference === null
        ? 'too few to say.'
        : `${differenceWords(difference)}${isClear ? '.' : ', so the two cannot be told apart.'}`}
    </p>
  );
}

/** Where the groups are ranges: every piece at its own number, so that the cuts hide nothing. */
function Along({ figures, table, units }: Props) {
  const { topic, domain, groupQuantity, by } = figures;
  const words = OUTCOME_WORDS[topic];
  if (!table.along || !domain || !words || groupQuantity === null) return null;
  const rows = [
    { label: words[0], spread: table.along.yes },
    { label: words[1], spread: table.along.no },
  ];
  return (
    <figure className="text-small">
      <figcaption
        className={`grid items-end gap-x-6 border-b border-soot py-1.5 text-note text-soot-2 ${SHARE_COLUMNS}`}
      >
        <span>{FIGURE_DIMENSIONS[by]}: every piece</span>
        <span aria-hidden="true" className="flex justify-between px-1">
          <span className="reading">{quantityWords(domain.low, groupQuantity, units)}</span>
          <span className="reading">{quantityWords(domain.high, groupQuantity, units)}</span>
        </span>
      </figcaption>
      {rows.map(({ label, spread }) => {
        const n =
          spread.kind === 'points'
            ? spread.values.length
            : spread.counts.reduce((sum, count) => sum + count, 0);
        return (
          <div
            key={label}
            className={`grid items-end gap-x-6 border-b border-line py-2 ${SHARE_COLUMNS}`}
          >
            <span className="first-letter:uppercase">{label}</span>
            <div className="px-1">
              <PointsPlot spread={spread} low={domain.low} high={domain.high} />
            </div>
            <span className="reading text-soot-2">{n}</span>
          </div>
        );
      })}
    </figure>
  );
}
