import type { FigureGroup, TopicFigures } from '#shared/api/figure-topics.ts';
import type { Units } from '#shared/units/units.ts';
import { DataTable, type Column } from '../ui/DataTable.tsx';
import { Disclosure } from '../ui/Disclosure.tsx';
import { percentWords, quantityWords } from './figure-words.ts';

interface Props {
  readonly figures: TopicFigures;
  readonly table: TopicFigures['tables'][number];
  readonly caption: string;
  readonly nameOf: (id: string) => string;
  readonly units: Units;
}

const TOO_FEW = 'too few to say';

/** The same as the plot, in figures. */
export function FigureTable({ figures, table, caption, nameOf, units }: Props) {
  const { quantity } = figures;
  const say = (value: number | null): string =>
    value === null || quantity === null ? TOO_FEW : quantityWords(value, quantity, units);
  const shares: Column<FigureGroup>[] = [
    { key: 'pieces', heading: 'Pieces', figures: true, cell: ({ cases }) => cases },
    { key: 'count', heading: 'So', figures: true, cell: ({ share }) => share?.count ?? 0 },
    {
      key: 'effective',
      heading: 'Count as',
      figures: true,
      cell: ({ share }) => (share?.effective ?? 0).toFixed(1),
    },
    {
      key: 'share',
      heading: 'Share',
      figures: true,
      cell: ({ share }) => (share?.share == null ? TOO_FEW : percentWords(share.share)),
    },
    {
      key: 'interval',
      heading: '95 % interval',
      figures: true,
      cell: ({ share }) =>
        share?.interval
          ? `${percentWords(share.interval.low)} to ${percentWords(share.interval.high)}`
          : '–',
    },
  ];
  const numbers: Column<FigureGroup>[] = [
    {
      key: 'q1',
      heading: 'Lower quartile',
      figures: true,
      cell: (g) => say(g.numbers?.q1 ?? null),
    },
    {
      key: 'median',
      heading: 'Median',
      figures: true,
      cell: (g) => say(g.numbers?.median ?? null),
    },
    {
      key: 'q3',
      heading: 'Upper quartile',
      figures: true,
      cell: (g) => say(g.numbers?.q3 ?? null),
    },
    {
      key: 'interval',
      heading: '95 % of the median',
      figures: true,
      cell: ({ numbers: own }) =>
        own?.interval ? `${say(own.interval.low)} to ${say(own.interval.high)}` : '–',
    },
  ];
  return (
    <Disclosure
      summary={
        <>
          As a table<span className="sr-only">: {caption}</span>
        </>
      }
    >
      <DataTable
        caption={caption}
        columns={[
          { key: 'group', heading: 'Group', cell: ({ id }) => nameOf(id) },
          { key: 'firings', heading: 'Firings', figures: true, cell: ({ firings }) => firings },
          { key: 'members', heading: 'Members', figures: true, cell: ({ members }) => members },
          ...(quantity === null ? shares : numbers),
        ]}
        rows={table.groups}
        rowKey={({ id }) => id}
      />
    </Disclosure>
  );
}
