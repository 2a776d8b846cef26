import { z } from 'zod';
import {
  AFTER_COVER,
  BARE_CLAY,
  COLOURS,
  COMBUSTIBLES,
  CONTAINERS,
  CRACK_NOTICED,
  CRACK_PLACES,
  DAMPNESS,
  FORMS,
  GLAZE_FAMILIES,
  LYING,
  MELTS,
  PLACEMENTS,
  PREHEATING,
  ROUTES,
  SEALS,
  SURFACE_FAULTS,
} from '../vocabulary/ware.ts';
import { idsOf } from '../vocabulary/terms.ts';
import { choice, count, measure, optionalText, yesNo } from './field-types.ts';

export const MAX_PIECES = 30;

export const combustibleSchema = z.strictObject({
  kind: z.enum(idsOf(COMBUSTIBLES)),
  other: optionalText(40),
  /** Loose, as poured. */
  litres: measure(0, 500, 'l'),
  dampness: choice(DAMPNESS),
  placement: choice(PLACEMENTS),
});

/** What happened after the draw: shared by the firing, or a piece's own. */
export const recipeSchema = z.strictObject({
  secondsInAir: measure(0, 1800, 's'),
  container: choice(CONTAINERS),
  containerLitres: measure(0.5, 2000, 'l'),
  combustibles: z.array(combustibleSchema).max(8).default([]),
  litByTheWare: yesNo,
  seal: choice(SEALS),
  burpedTimes: count(0, 20),
  burpedFirstAfterSeconds: measure(0, 3600, 's'),
  minutesCovered: measure(0, 2880, 'min'),
  then: choice(AFTER_COVER),
  thenAfterMinutes: measure(0, 2880, 'min'),
});
export type Recipe = z.output<typeof recipeSchema>;

/** A row stands for `count` pieces alike. */
export const pieceSchema = z.strictObject({
  /** Made by the browser so that rows keep their identity while edited; means nothing else. */
  key: z.string().max(40),
  form: choice(FORMS),
  count: count(1, 100),
  spanMm: measure(5, 1000, 'mm'),
  wallMm: measure(1, 80, 'mm'),
  clay: optionalText(60),
  bisqueCone: optionalText(8),
  bisqueCelsius: measure(600, 1300, '°C'),
  glazeName: optionalText(60),
  glazeFamily: choice(GLAZE_FAMILIES),
  dampness: choice(DAMPNESS),
  preheating: choice(PREHEATING),
  kilnCelsiusAtLoading: measure(-30, 1150, '°C'),
  lies: choice(LYING),
  targetCelsius: measure(400, 1150, '°C'),
  drawMinute: measure(0, 2880, 'min'),
  drawOrder: count(1, 100),
  route: choice(ROUTES),
  /** Null: the firing's shared recipe. */
  recipe: recipeSchema.nullable().default(null),
  melt: choice(MELTS),
  colour: choice(COLOURS),
  bareClay: choice(BARE_CLAY),
  faults: z
    .array(z.enum(idsOf(SURFACE_FAULTS)))
    .max(10)
    .default([]),
  cracked: yesNo,
  cracks: z
    .array(z.strictObject({ place: choice(CRACK_PLACES), noticed: choice(CRACK_NOTICED) }))
    .max(8)
    .default([]),
  whole: yesNo,
  remark: optionalText(300),
});
export type Piece = z.output<typeof pieceSchema>;
