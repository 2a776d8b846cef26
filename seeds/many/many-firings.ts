import type { Reading } from '#shared/firing/types.ts';
import { kilnFieldsSchema, type KilnFields } from '#shared/note/kiln-fields.ts';
import {
  noteFieldsSchema,
  type NoteFields,
  type NoteFieldsInput,
} from '#shared/note/note-fields.ts';
import type { StoryBlock } from '#shared/note/story.ts';
import { CHANGE_IDS } from '#shared/vocabulary/changes.ts';
import { FUEL_IDS, WEATHERS, WINDS } from '#shared/vocabulary/kiln.ts';
import { idsOf } from '#shared/vocabulary/terms.ts';
import { CAUSE_IDS } from '#shared/vocabulary/troubles.ts';
import { FORMS, GLAZE_FAMILIES } from '#shared/vocabulary/ware.ts';
import { FIRING_KINDS, type FiringKind } from '../simulation/firing-kinds.ts';
import { simulateFiring } from '../simulation/simulate-firing.ts';
import type { TextMaker } from './told-text.ts';

/** Readings kept of a made-up record: enough to be read like any other, few enough to load fast. */
const READINGS_KEPT = 120;
/** Courses fired on paper once and then shared, so that ten thousand notes need no ten thousand fires. */
const SEEDS_PER_KIND = 12;

/** A record as many notes may have it. */
export interface Course {
  readonly readings: readonly Reading[];
  readonly marks: NonNullable<NoteFieldsInput['record']>['marks'];
  readonly targetCelsius: number;
  readonly peakCelsius: number;
  readonly gaveUp: boolean;
}

/** Every kind of firing several times, each a little different. */
export function manyCourses(): Course[] {
  return (Object.keys(FIRING_KINDS) as FiringKind[]).flatMap((kind) =>
    Array.from({ length: SEEDS_PER_KIND }, (_, seed): Course => {
      const firing = { ...FIRING_KINDS[kind], seed: seed + 1 };
      const lossFactor = firing.lossFactor * (0.94 + 0.01 * seed);
      const { readings, marks, reachedTarget } = simulateFiring({ ...firing, lossFactor });
      const step = Math.max(1, Math.ceil(readings.length / READINGS_KEPT));
      const kept = readings.filter((_reading, at) => at % step === 0 || at === readings.length - 1);
      return {
        readings: kept,
        marks: [...marks],
        targetCelsius: firing.targetCelsius,
        peakCelsius: Math.round(Math.max(...kept.map(({ celsius }) => celsius))),
        gaveUp: !reachedTarget,
      };
    }),
  );
}

/** Numbers and choices drawn from one source, so that the same seed tells the same stories. */
export interface Lot {
  readonly random: () => number;
  readonly whole: (from: number, to: number) => number;
  readonly oneOf: <T>(list: readonly T[]) => T;
}

export function createLot(random: () => number): Lot {
  return {
    random,
    whole: (from, to) => from + Math.floor(random() * (to - from + 1)),
    oneOf: (list) => {
      const drawn = list[Math.floor(random() * list.length)];
      if (drawn === undefined) throw new Error('Nothing to draw from.');
      return drawn;
    },
  };
}

export function drawKiln({ whole, oneOf }: Lot, text: TextMaker, number: number): KilnFields {
  const diameter = whole(300, 620);
  return kilnFieldsSchema.parse({
    name: `Kiln ${text.word()} ${String(number)}`,
    wall: 'fibre',
    fibreDensityKgM3: 128,
    fibreThicknessMm: oneOf([25, 50, 75]),
    flue: 'lid',
    burnerKind: 'venturi',
    burners: 1,
    fuel: oneOf(FUEL_IDS),
    probe: 'K',
    timeZone: 'Europe/London',
    shape: 'round',
    insideDiameterMm: diameter,
    insideHeightMm: whole(300, 700),
    nominalKw: whole(12, 45),
    about: text.sentences(15),
  });
}

const paragraph = (text: string): StoryBlock => ({
  type: 'paragraph',
  content: [{ type: 'text', text }],
});

/** One note of a kiln, with the course it was fired by. */
export function drawNote(
  lot: Lot,
  text: TextMaker,
  course: Course,
  { kilnId, date }: { kilnId: number; date: string },
): NoteFields {
  const { random, whole, oneOf } = lot;
  const some = <T>(list: readonly T[], most: number): T[] => [
    ...new Set(Array.from({ length: whole(0, most) }, () => oneOf(list))),
  ];
  const cracked = random() < 0.15;
  const forms = idsOf(FORMS);
  const glazes = idsOf(GLAZE_FAMILIES);
  return noteFieldsSchema.parse({
    title: text.words(whole(4, 9)).slice(0, 110),
    kilnId,
    when: {
      date,
      startTime: `${String(whole(8, 18)).padStart(2, '0')}:30`,
      timeZone: 'Europe/London',
      startClass: 'cold',
      startCelsius: 15,
    },
    setUp: {
      airCelsius: whole(-2, 28),
      wind: oneOf(idsOf(WINDS)),
      weather: oneOf(idsOf(WEATHERS)),
    },
    plan: {
      drawnBecause: course.gaveUp ? 'gave-up' : 'melt',
      targetBy: 'temperature',
      targetCelsius: course.targetCelsius,
      peakBy: 'temperature',
      peakCelsius: course.peakCelsius,
      typedIn: 'C',
    },
    record: { marks: course.marks },
    pieces: Array.from({ length: whole(1, 3) }, (_, row) => ({
      key: `row-${String(row + 1)}`,
      form: oneOf(forms),
      count: whole(1, 6),
      spanMm: whole(60, 420),
      wallMm: whole(4, 10),
      clay: `${text.word()} body`,
      bisqueCelsius: 1000,
      glazeName: text.words(2).slice(0, 60),
      glazeFamily: oneOf(glazes),
      dampness: 'dry',
      preheating: 'cold',
      route: 'covered',
      melt: course.gaveUp ? 'under-fired' : 'matured',
      colour: oneOf(['as-hoped', 'partly', 'not']),
      cracked: cracked && row === 0,
      ...(cracked && row === 0 ? { cracks: [{ place: 'rim', noticed: 'in-the-water' }] } : {}),
      whole: !(cracked && row === 0),
      remark: random() < 0.3 ? text.sentences(8).slice(0, 200) : '',
    })),
    result: {
      troubles: course.gaveUp ? ['stall'] : [],
      causes: some(CAUSE_IDS, 2),
    },
    changes: some(CHANGE_IDS, 2).map((change) => ({ change, purpose: text.words(6) })),
    story: {
      type: 'doc',
      content: [
        paragraph(text.sentences(whole(50, 100))),
        paragraph(text.sentences(whole(40, 90))),
      ],
    },
    cautionsRead: true,
  });
}
