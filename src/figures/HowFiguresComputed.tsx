import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import type { FigureTopic } from '#shared/vocabulary/figures.ts';
import { Disclosure } from '../ui/Disclosure.tsx';

const TOPIC_RULES: Readonly<Record<FigureTopic, string>> = {
  cracks:
    'A piece counts as cracked or not as its author says, whenever the crack was noticed; pieces of which that is not said are left out.',
  colour:
    'A piece counts where its author says how the colour came out; “partly” counts as not as hoped. Litres of combustible are loose, as poured.',
  'bare-clay':
    'A piece counts where its bare clay is called black, patchy, grey or pale. Litres of combustible are loose, as poured.',
  time: 'From the start of the firing until the temperature aimed at, read off the record, else as the author gives it. Aims differ from firing to firing.',
  hold: 'How long the kiln was held, read off the record, else as the author gives it; no hold is 0.',
  peak: 'The highest temperature of the record, else as the author gives it, by the pyrometer.',
  stalls:
    'The level of every stall found in a record. A firing with two counts twice here and once among the firings.',
  gas: 'The gas used as the author weighed or reckoned it.',
};

/** The rules behind the plot, in plain words, with their sources. */
export function HowFiguresComputed({
  topic,
  units,
}: {
  readonly topic: FigureTopic;
  readonly units: Units;
}) {
  const say = (celsius: number): string => formatTemperature(celsius, units.temperature);
  return (
    <Disclosure summary="How this is computed">
      <div className="max-w-measure space-y-3">
        <p>
          {TOPIC_RULES[topic]}
          {topic === 'cracks' &&
            ` Rates are read off the record, by the pyrometer: that of the crossing from ${say(550)} to ${say(600)}, on both sides of quartz’s ${say(573)}; the mean rate of the climb from ${say(400)} to ${say(700)}.`}
        </p>
        <p>
          <strong className="font-[650]">What counts.</strong> Published notes only, without what
          their authors dispute. Cold and hot starts are never pooled. Each piece or firing is in
          one group. The cuts between ranges are our own choice. Under five firings or three members
          it is too few to say.
        </p>
        <p>
          <strong className="font-[650]">Shares.</strong> The bar is Wilson’s 95&nbsp;% interval, a
          difference has Newcombe’s (Statistics in Medicine 17, 1998, 857–872 and 873–890). Pieces
          of one member are alike, so n pieces count as n ÷ (1 + 0.2·(k − 1)), where k is the sum of
          the squares of each member’s pieces, divided by n. The 0.2 is our own choice. A member may
          have pieces in both groups of a difference. Several comparisons looked at together find
          something by chance.
        </p>
        <p>
          <strong className="font-[650]">Numbers.</strong> Each square is one; past 400 they are
          counted in columns. Median and quartiles are of type 7 (Hyndman and Fan, The American
          Statistician 50, 1996, 361–365). From eight members on the median has a 95&nbsp;%
          interval, by drawing members anew a thousand times.
        </p>
        <p>Groups differ in more than what they are told apart by: this is no proof of a cause.</p>
      </div>
    </Disclosure>
  );
}
