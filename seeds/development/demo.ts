import { kilnFieldsSchema, insideVolumeLitres } from '#shared/note/kiln-fields.ts';
import {
  noteFieldsSchema,
  type NoteFields,
  type NoteFieldsInput,
} from '#shared/note/note-fields.ts';
import { proposeChanges } from '#shared/note/proposed-changes.ts';
import type { Reading } from '#shared/firing/types.ts';
import type { NoteStatus } from '#shared/vocabulary/statuses.ts';
import { seededRandom, normalNumber } from '../simulation/seeded-random.ts';
import { fire } from './firings/climb.ts';
import type { FiringTold } from './firings/firing.ts';
import { beehive } from './firings/beehive.ts';
import { bucket } from './firings/bucket.ts';
import { churn } from './firings/churn.ts';
import { driftwood } from './firings/driftwood.ts';
import { drum } from './firings/drum.ts';
import { dustbin } from './firings/dustbin.ts';
import { ferry } from './firings/ferry.ts';
import { henhouse } from './firings/henhouse.ts';
import { lantern } from './firings/lantern.ts';
import { orchard } from './firings/orchard.ts';
import { pellow } from './firings/pellow.ts';
import { plug } from './firings/plug.ts';
import { ropers } from './firings/ropers.ts';
import { school } from './firings/school.ts';
import { staithe } from './firings/staithe.ts';
import { unpublished } from './firings/unpublished.ts';
import { kilns, loans, type DemoKiln, type DemoLoan } from './kilns.ts';
import { people, type DemoPerson } from './people.ts';
import { pictureName } from './story.ts';

/** A logger's file, to be stored as an uploaded record; hand-noted readings are typed rows instead. */
export interface DemoRecord {
  readonly fileName: string;
  readonly csv: string;
  readonly readings: readonly Reading[];
  readonly secondProbe: readonly Reading[] | null;
}
export interface DemoFiring {
  readonly key: string;
  readonly kilnKey: string;
  readonly authorKey: string;
  readonly status: NoteStatus;
  /** `kilnId` and `triedNoteId` are null, and pictures bear made-up names, until loaded. */
  readonly fields: NoteFieldsInput;
  readonly record: DemoRecord | null;
  readonly publishedOn: string | null;
  readonly pictures: readonly {
    readonly key: string;
    readonly name: string;
    readonly alt: string;
  }[];
  /** Key of the firing whose change this one tried. */
  readonly triedKey: string | null;
  readonly remarks: readonly { readonly pointer: string; readonly text: string }[];
  readonly reason: string | null;
  readonly told: FiringTold;
}
export interface Demo {
  readonly people: readonly DemoPerson[];
  readonly kilns: readonly DemoKiln[];
  readonly loans: readonly DemoLoan[];
  /** In the order in which they were fired. */
  readonly firings: readonly DemoFiring[];
}

const TOLD: readonly FiringTold[] = [
  ...ropers,
  ...school,
  ...drum,
  ...henhouse,
  ...lantern,
  ...beehive,
  ...churn,
  ...ferry,
  ...staithe,
  ...orchard,
  ...plug,
  ...driftwood,
  ...pellow,
  ...dustbin,
  ...bucket,
  ...unpublished,
];

/** Tens of readings a minute keep; a name makes the seed, so that adding a firing alters no other. */
function seedOf(key: string): number {
  let hash = 2166136261;
  for (let i = 0; i < key.length; i += 1) hash = Math.imul(hash ^ key.charCodeAt(i), 16777619);
  return hash >>> 0;
}

const oneDecimal = (value: number): number => Math.round(value * 10) / 10;

function csvOf(readings: readonly Reading[], second: readonly Reading[] | null): string {
  const head = second ? 'minute,upper,lower' : 'minute,celsius';
  const rows = readings.map(({ minute, celsius }, row) => {
    const lower = second?.[row];
    const start = `${minute.toFixed(3)},${oneDecimal(celsius).toFixed(1)}`;
    return lower ? `${start},${oneDecimal(lower.celsius).toFixed(1)}` : start;
  });
  return `${[head, ...rows].join('\n')}\n`;
}

/** A second probe lags behind the first and stays cooler, in proportion to how hot it is. */
function coolerProbe(readings: readonly Reading[], target: number, cooler: number, seed: number) {
  const random = seededRandom(seed);
  return readings.map(({ minute, celsius }) => ({
    minute,
    celsius: oneDecimal(celsius * (1 - cooler / target) + normalNumber(random) * 1.4),
  }));
}

function buildFiring(told: FiringTold): DemoFiring {
  const kiln = kilns.find(({ key }) => key === told.kiln);
  if (!kiln) throw new Error(`${told.key}: no kiln ${told.kiln}`);
  const kilnFields = kilnFieldsSchema.parse(kiln.fields);
  const seed = seedOf(told.key);
  const air = told.set.airCelsius ?? 15;
  const start = told.climb.startCelsius ?? air;
  const fired = fire(told.climb, {
    seed,
    litres: insideVolumeLitres(kilnFields) ?? 60,
    airCelsius: air,
    targetCelsius: told.target,
  });
  const isLogged = told.climb.by.startsWith('logger');
  const readings = fired.readings.map(({ minute, celsius }) => ({
    minute: Math.round(minute * 1000) / 1000,
    celsius: isLogged ? oneDecimal(celsius) : Math.round(celsius),
  }));
  const cooler = told.climb.secondProbeCooler;
  const secondProbe =
    cooler === undefined ? null : coolerProbe(readings, told.target, cooler, seed + 7);
  const peak = fired.peakCelsius;
  // What a potter with a watch would say: the whole minute in which it was there.
  const reached = fired.reachedMinute;
  const hold = told.climb.hold ?? 0;
  const gaveUp = told.because === 'gave-up';
  const marks = [...fired.marks.map(({ minute, kind }) => ({ minute: oneDecimal(minute), kind }))];
  if (!gaveUp && told.pieces.some((piece) => piece.route !== 'saggar')) {
    marks.push({ minute: oneDecimal(fired.shutOffMinute + 1), kind: 'drawn' });
  }
  const isDraft = told.status === 'draft';
  const fields: NoteFieldsInput = {
    title: told.title,
    kilnId: null,
    when: {
      date: told.date,
      startTime: told.time,
      timeZone: 'Europe/London',
      unreportedFirings: told.unreported ?? 0,
      startClass: start < 100 ? 'cold' : 'hot',
      startCelsius: start,
    },
    setUp: told.set,
    plan: {
      drawnBecause: told.because,
      targetBy: told.targetCone === undefined ? 'temperature' : 'cone',
      targetCelsius: told.target,
      targetCone: told.targetCone ?? '',
      peakBy: 'temperature',
      peakCelsius: told.peakDeclared ?? Math.round(peak),
      typedIn: told.typedIn ?? 'C',
      timeToTemperatureMinutes: gaveUp || reached === null ? null : Math.round(reached),
      noHold: hold === 0,
      holdPlannedMinutes: gaveUp ? null : hold,
      holdKeptMinutes: hold === 0 ? null : hold,
    },
    record: {
      typedRows: isLogged ? [] : readings,
      marks,
    },
    pieces: told.pieces.map((piece, row) => ({ key: `row-${String(row + 1)}`, ...piece })),
    ...(told.smoke ? { reduction: told.smoke } : {}),
    result: {
      troubles: [...(told.troubles ?? [])],
      causes: [...(told.causes ?? [])],
      surprised: told.surprised ?? '',
      nextTime: told.nextTime ?? '',
    },
    changes: (told.changes ?? []).map(([change, purpose]) => ({ change, purpose })),
    story: told.story,
    cautionsRead: !isDraft,
    checkAnswers: [...(told.answers ?? [])],
  };
  return {
    key: told.key,
    kilnKey: told.kiln,
    authorKey: told.author,
    status: told.status ?? 'published',
    fields,
    record: isLogged
      ? { fileName: `${told.key}.csv`, csv: csvOf(readings, secondProbe), readings, secondProbe }
      : null,
    publishedOn: told.published ?? null,
    pictures: told.story.content
      .flatMap(({ type, attrs }) =>
        type === 'picture' ? [{ name: String(attrs?.['name']), alt: String(attrs?.['alt']) }] : [],
      )
      .map(({ name, alt }) => ({ key: keyOfPicture(name), name, alt })),
    triedKey: told.tried ?? null,
    remarks: told.remarks ?? [],
    reason: told.reason ?? null,
    told,
  };
}

const PICTURE_KEYS = [
  'crackle-bowl',
  'crackle-bottle',
  'pale-crackle',
  'turquoise-crackle-jar',
  'ash-crackle-teabowl',
  'horsehair-pot',
  'feather-bottle',
  'slip-resist-vase',
  'slip-resist-shell',
  'dipped-bowl',
  'saggar-pot',
  'sprayed-vase',
  'copper-matt-vase',
  'copper-matt-brown',
  'copper-matt-sphere',
  'lustre-bowl',
  'lustre-green',
  'plate-cracked-across',
  'plate-whole',
  'platter-dunting',
  'cracked-tile',
  'burst-shards',
  'dull-and-bright',
  'crawled-bowl',
  'blisters-close',
  'lid-stuck-jar',
  'bottle-split',
  'broken-handle',
  'stuck-foot',
  'kiln-section',
  'burner-plan',
  'floor-layers',
  'two-probes',
  'flame-lifting-off',
  'reduction-bin-section',
  'notebook-stall',
  'spyhole-glow',
  'draw-tiles',
  'kiln-in-wind',
  'wind-shelter',
  'bins-smoking',
  'draw-at-dusk',
  'kiln-in-rain',
  'frosted-cylinder',
  'driftwood-kiln',
  'hill-in-frost',
] as const;
const keyByName = new Map(PICTURE_KEYS.map((key): [string, string] => [pictureName(key), key]));

function keyOfPicture(name: string): string {
  const key = keyByName.get(name);
  if (key === undefined) throw new Error('A story shows a picture that nobody drew.');
  return key;
}

/**
 * Differences from the earlier firing that the author did not name as a change were not meant:
 * answered as an author would answer the server's proposals.
 */
function answerProposals(firings: readonly DemoFiring[]): DemoFiring[] {
  const last = new Map<string, NoteFields>();
  return firings.map((firing) => {
    const fields = noteFieldsSchema.parse(firing.fields);
    const kilnInput = kilns.find(({ key }) => key === firing.kilnKey)?.fields;
    const kiln = kilnInput ? kilnFieldsSchema.parse(kilnInput) : null;
    const earlier = last.get(firing.kilnKey);
    if (firing.status === 'published') last.set(firing.kilnKey, fields);
    if (!earlier || firing.status === 'draft') return firing;
    const named = fields.changes.map(({ change }) => change);
    const changesNotMeant = proposeChanges({ fields: earlier, kiln }, { fields, kiln })
      .map(({ change }) => change)
      .filter((change) => !named.includes(change));
    return { ...firing, fields: { ...firing.fields, changesNotMeant } };
  });
}

const byTime = (a: FiringTold, b: FiringTold): number =>
  `${a.date} ${a.time}` < `${b.date} ${b.time}` ? -1 : 1;

export const demo: Demo = {
  people,
  kilns,
  loans,
  firings: answerProposals([...TOLD].sort(byTime).map(buildFiring)),
};
