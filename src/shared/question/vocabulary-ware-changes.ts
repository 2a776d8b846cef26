import type { VocabularyEntry } from './vocabulary-entry.ts';

/** Changes a question names, of load, pace, ware, glaze and reduction. */
export const WARE_CHANGE_VOCABULARY: readonly VocabularyEntry[] = [
  {
    means: ['change:load-less'],
    says: [
      'fewer pot|pots|piece|pieces|things',
      'less ware|load|in kiln',
      'lighter|smaller|half load',
      'less pots',
    ],
  },
  {
    means: ['change:load-more'],
    says: ['more pots|pieces|ware', 'fuller|bigger|heavier load', 'fuller kiln'],
  },
  {
    means: ['change:ware-dried'],
    says: [
      'dry @ware first?',
      'dry out @ware',
      'dry|drying bisque|biscuit',
      'dry|drying .. in|on oven|radiator|stove|airing',
      'pots dry first',
    ],
  },
  {
    means: ['change:ware-preheated'],
    says: ['preheat', 'preheat @ware', 'warm @ware first|on', 'pre heat|warm'],
  },
  {
    means: ['change:ware-off-the-shelf'],
    says: [
      'on stilts|points|props|wads',
      'on three|3 points|stilts|props|wads',
      'stilt|stilts',
      'raise|lift ware|plate|pot off shelf',
      'off shelf',
    ],
  },
  {
    means: ['change:slower-start'],
    says: [
      'slower start|climb|heating|firing|heat|warm|ramp',
      'start slow|slower|slowly|gently',
      'go slow|slower|slowly|gently (to|up|until|through)?',
      'heat|fire|warm slow|slower|slowly|gently',
      'bring|take it? up slow|slowly|gently',
      'more slowly',
      'slow down',
      'slow it? down',
      'slow start',
      'gentle|gently',
      'candle',
      'candling',
    ],
  },
  {
    means: ['change:faster'],
    says: [
      'faster climb|firing|heating',
      'fire|climb|heat|go faster|quicker',
      'speed up',
      'speed it up',
      'faster',
    ],
  },
  {
    means: ['change:target-up'],
    says: [
      'fire|go|take|aim higher|hotter',
      'higher target|temperature|temp|peak',
      'raise|up|increase target|temperature|temp|peak',
      'hotter firing',
    ],
  },
  {
    means: ['change:target-down'],
    says: [
      'fire|go|aim lower|cooler',
      'lower|reduce|drop target|peak',
      'lower temperature|temp',
      'cooler firing',
    ],
  },
  {
    means: ['change:hold-longer'],
    says: ['longer hold|soak', 'hold|soak longer', 'hold|soak it? longer', 'add hold|soak'],
  },
  {
    means: ['change:hold-shorter'],
    says: ['shorter hold|soak', 'hold|soak less|shorter', 'no hold|soak'],
  },
  {
    means: ['change:drawn-by-melt'],
    says: ['draw|pull by eye|melt|look', 'watch melt|glaze', 'go by melt|eye'],
  },
  { means: ['change:form'], says: ['other|different form|shape'] },
  {
    means: ['change:wall-thickness'],
    says: ['thinner|thicker wall|walls|base|pot|pots|foot', 'throw thinner|thicker'],
  },
  {
    means: ['change:clay'],
    says: ['other|different|change|new clay', 'different clay body', 'more grog', 'add grog'],
  },
  {
    means: ['change:bisque-higher'],
    says: [
      'higher bisque|biscuit',
      'bisque|biscuit higher|hotter',
      'bisque|biscuit fire? higher|hotter',
    ],
  },
  {
    means: ['change:bisque-lower'],
    says: ['lower bisque|biscuit', 'bisque|biscuit lower|cooler', 'softer bisque'],
  },
  { means: ['change:glaze'], says: ['other|different|another|new|change glaze'] },
  {
    means: ['change:glaze-thicker'],
    says: ['thicker glaze|coat|coats', 'glaze thicker', 'another|extra coat', 'more glaze'],
  },
  {
    means: ['change:glaze-thinner'],
    says: ['thinner glaze|coat|coats', 'glaze thinner', 'less glaze', 'fewer coats'],
  },
  {
    means: ['change:combustible-kind'],
    says: [
      'other|different combustible|material',
      '@combustible instead of? @combustible',
      'switch|change|swap|move to (@combustible)',
      'switch|change|swap from? (@combustible) to|for (@combustible)',
    ],
  },
  {
    means: ['change:combustible-more'],
    says: ['more|extra @combustible', 'more combustible|material'],
  },
  { means: ['change:combustible-less'], says: ['less @combustible', 'less combustible|material'] },
  {
    means: ['change:combustible-drier'],
    says: ['drier @combustible', 'dry|dried @combustible', '@combustible drier|dry'],
  },
  { means: ['change:container-smaller'], says: ['@smaller @bin', '@bin smaller'] },
  { means: ['change:container-bigger'], says: ['@bigger @bin', '@bin bigger'] },
  {
    means: ['change:sealed-better'],
    says: [
      'seal bin|drum|can|bucket',
      'seal with sand|cloth|towel',
      'better|tighter seal',
      'seal better|tight|tightly',
      'sand seal',
      'wet towel|cloth',
    ],
  },
  {
    means: ['change:covered-sooner'],
    says: [
      'cover @ware? sooner|faster|quicker|quickly|earlier',
      'quicker|faster to|into @bin',
      'faster|quicker transfer',
      'lid on faster|sooner',
    ],
  },
  {
    means: ['change:covered-later'],
    says: ['cover later', 'wait before cover|lid|covering', 'longer in air'],
  },
  {
    means: ['change:covered-longer'],
    says: [
      'cover longer',
      'leave|left longer in @bin',
      'longer in @bin|reduction|smoke',
      'longer reduction|smoke',
    ],
  },
  {
    means: ['change:covered-shorter'],
    says: ['shorter reduction|smoke', 'shorter in @bin', 'uncover earlier|sooner'],
  },
  { means: ['change:burped'], says: ['burp', 'burp @bin', 'burping'] },
  { means: ['change:not-burped'], says: ['without|not|no|never burp'] },
  {
    means: ['change:not-quenched'],
    says: [
      'without|not|no|never quench|quenching',
      'leave|let to? cool slow|slowly|slower|itself|alone|naturally',
      'instead of quench',
    ],
  },
  {
    means: ['change:probe-moved-or-replaced'],
    says: [
      'move|replace|new|swap|reposition|change probe|thermocouple|pyrometer',
      'probe|thermocouple moved|position',
    ],
  },
];
