import { idsOf } from './terms.ts';

/** What the plots of *Figures* are about. */
export const FIGURE_TOPICS = {
  cracks: 'Cracks',
  colour: 'Colour as hoped',
  'bare-clay': 'Bare clay black',
  time: 'Time to temperature',
  hold: 'Hold',
  peak: 'Peak',
  stalls: 'Level of stalls',
  gas: 'Gas per firing',
} as const;
export type FigureTopic = keyof typeof FIGURE_TOPICS;
export const FIGURE_TOPIC_IDS = idsOf(FIGURE_TOPICS);

/** What firings or pieces are told apart by. */
export const FIGURE_DIMENSIONS = {
  form: 'Form',
  span: 'Span',
  'wall-thickness': 'Wall thickness',
  clay: 'Clay',
  rate: 'Mean rate of the climb',
  crossing: 'Rate of the crossing',
  lies: 'How the ware lay',
  preheating: 'Preheating',
  bisque: 'Bisque temperature',
  quench: 'After covering',
  route: 'Route after the draw',
  combustible: 'Combustible',
  'litres-per-litre': 'Combustible, litres per litre of container',
  'seconds-in-air': 'Seconds to cover',
  volume: 'Kiln volume',
  lining: 'Lining',
  fuel: 'Fuel',
  glaze: 'Glaze family',
} as const;
export type FigureDimension = keyof typeof FIGURE_DIMENSIONS;
export const FIGURE_DIMENSION_IDS = idsOf(FIGURE_DIMENSIONS);

const REDUCTION = ['route', 'combustible', 'litres-per-litre', 'seconds-in-air'] as const;
const KILN = ['volume', 'lining', 'fuel', 'glaze'] as const;

/** What each topic can be told apart by; the first unless another is asked for. */
export const DIMENSIONS_OF_TOPIC: Readonly<Record<FigureTopic, readonly FigureDimension[]>> = {
  cracks: [
    'crossing',
    'rate',
    'form',
    'span',
    'wall-thickness',
    'clay',
    'lies',
    'preheating',
    'bisque',
    'quench',
  ],
  colour: REDUCTION,
  'bare-clay': REDUCTION,
  time: KILN,
  hold: KILN,
  peak: KILN,
  stalls: KILN,
  gas: KILN,
};

/** Topics about shares of pieces; the others are about a number of each firing. */
export const SHARE_TOPICS: readonly FigureTopic[] = ['cracks', 'colour', 'bare-clay'];

/** Kinds of numbers, each shown in the reader's unit: stored in °C, °C/min, mm, l, min, s, kg. */
export const FIGURE_QUANTITIES = [
  'temperature',
  'rate',
  'length',
  'chamber',
  'duration',
  'seconds',
  'mass',
  'ratio',
] as const;
export type FigureQuantity = (typeof FIGURE_QUANTITIES)[number];

/**
 * Where numbers are cut into groups: each cut begins a group. The cuts are our own choice, so that
 * groups fill; nothing is known to change at them. A crossing under 20 °C/min is called gentle and
 * one of 40 or more fast, as the check of flat ware does.
 */
export const FIGURE_CUTS: Readonly<
  Partial<Record<FigureDimension, { quantity: FigureQuantity; cuts: readonly number[] }>>
> = {
  span: { quantity: 'length', cuts: [100, 200, 300] },
  'wall-thickness': { quantity: 'length', cuts: [6, 8, 10] },
  rate: { quantity: 'rate', cuts: [20, 40] },
  crossing: { quantity: 'rate', cuts: [20, 40] },
  bisque: { quantity: 'temperature', cuts: [950, 1000, 1050] },
  'litres-per-litre': { quantity: 'ratio', cuts: [0.1, 0.25, 0.5] },
  'seconds-in-air': { quantity: 'seconds', cuts: [10, 20, 40] },
  volume: { quantity: 'chamber', cuts: [50, 100, 200] },
};

/** The number a topic is about; null for shares of pieces. */
export const QUANTITY_OF_TOPIC: Readonly<Record<FigureTopic, FigureQuantity | null>> = {
  cracks: null,
  colour: null,
  'bare-clay': null,
  time: 'duration',
  hold: 'duration',
  peak: 'temperature',
  stalls: 'temperature',
  gas: 'mass',
};
