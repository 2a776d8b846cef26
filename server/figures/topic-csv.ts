import type { TopicQuery } from '#shared/api/figure-topics.ts';
import { paths } from '#shared/paths.ts';
import { DIMENSIONS_OF_TOPIC, type FigureTopic } from '#shared/vocabulary/figures.ts';
import { casesOf, type FigureFiring } from './topic-cases.ts';

/** A spreadsheet takes a cell that begins so for a formula; an apostrophe before it prevents that. */
const FORMULA_LIKE = /^[=+\-@\t\r]/;

function textCell(text: string): string {
  const safe = FORMULA_LIKE.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

const numberCell = (value: number | null): string =>
  value === null ? '' : String(Math.round(value * 1e4) / 1e4);

const UNIT_OF_TOPIC: Readonly<Record<FigureTopic, string>> = {
  cracks: 'cracked',
  colour: 'as hoped',
  'bare-clay': 'black',
  time: 'minutes to temperature',
  hold: 'hold minutes',
  peak: 'peak celsius',
  stalls: 'stall celsius',
  gas: 'gas kg',
};

/** The rows behind a plot, in °C, mm, minutes and kg: one a row of pieces, a firing or a stall. */
export function topicCsv(
  topic: FigureTopic,
  query: TopicQuery,
  firings: readonly FigureFiring[],
): string {
  const possible = DIMENSIONS_OF_TOPIC[topic];
  const by = possible.find((each) => each === query.by) ?? possible[0];
  if (by === undefined) return '';
  const { cases } = casesOf(topic, by, firings, query);
  const names = [
    'note',
    'fired on',
    'kiln',
    'start',
    by,
    `${by} number`,
    UNIT_OF_TOPIC[topic],
    'pieces',
  ];
  const rows = cases.map(({ firing, startClass, group, along, yes, value, count }) => [
    paths.note(firing.noteId, ''),
    firing.firedOn,
    String(firing.kilnId),
    startClass,
    textCell(group),
    numberCell(along),
    yes === null ? numberCell(value) : yes ? 'yes' : 'no',
    yes === null ? '' : String(count),
  ]);
  return `${[names, ...rows].map((row) => row.join(',')).join('\r\n')}\r\n`;
}
