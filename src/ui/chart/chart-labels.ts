import { estimateTextWidth, placeLabels } from '../label-lanes.ts';
import type { LabelWish } from '../label-lanes.ts';
import { LABEL_SIZE } from '../lane-size.ts';
import { minuteToX } from './chart-frame.ts';
import type { MinuteWindow } from './minute-window.ts';
import type { RecordChartProps } from './record-chart-props.ts';

const NARROW_PX = 560;
const MOST_NAMED_ON_NARROW = 3;

type Labelled = Pick<RecordChartProps, 'marks' | 'stretches' | 'hold'>;

/** Marks, stretches and the hold as labels in lanes over the plot: those in sight. */
export function chartLabels(props: Labelled, window: MinuteWindow, width: number) {
  const { marks = [], stretches = [], hold } = props;
  const xOf = minuteToX(window, width);
  const numbered = width < NARROW_PX && marks.length > MOST_NAMED_ON_NARROW;
  const texts = new Map<string, string>();
  const wishes: LabelWish[] = [];
  const wish = (id: string, text: string, fromMinute: number, toMinute?: number) => {
    if ((toMinute ?? fromMinute) < window.from || fromMinute > window.to) return;
    texts.set(id, text);
    wishes.push({
      id,
      x: xOf(Math.max(window.from, fromMinute)),
      textWidth: estimateTextWidth(text, LABEL_SIZE),
      ...(toMinute === undefined ? {} : { spanToX: xOf(Math.min(window.to, toMinute)) }),
    });
  };
  stretches.forEach(({ label, fromMinute, toMinute }, index) =>
    wish(`stretch-${index}`, label, fromMinute, toMinute),
  );
  if (hold) wish('hold', holdWords(hold), hold.fromMinute, hold.toMinute);
  marks.forEach(({ label, minute }, index) =>
    wish(`mark-${index}`, numbered ? String(index + 1) : label, minute),
  );
  return { ...placeLabels(wishes, width), texts, numbered };
}

/** "hold 4.5 min". */
export function holdWords(hold: {
  readonly fromMinute: number;
  readonly toMinute: number;
}): string {
  return `hold ${Math.round((hold.toMinute - hold.fromMinute) * 2) / 2}\u00a0min`;
}
