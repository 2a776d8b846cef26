import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { kilnFieldsSchema, type KilnFields } from '#shared/note/kiln-fields.ts';
import { draftSchema, type Draft } from '#shared/api/notes.ts';
import { kilnSchema, type Kiln } from '#shared/api/kilns.ts';
import { DESK_QUESTIONS, deskNoteSchema } from '#shared/api/desk.ts';
import type { Client } from './api.ts';

/** A small round fibre kiln on propane. */
export function kilnFields(traits: Partial<KilnFields> = {}): KilnFields {
  return kilnFieldsSchema.parse({
    name: 'Drum by the hedge',
    opening: 'top-hat',
    shape: 'round',
    insideDiameterMm: 380,
    insideHeightMm: 420,
    wall: 'fibre',
    fibreThicknessMm: 25,
    fibreDensityKgM3: 128,
    flue: 'lid',
    flueOpeningMm: 100,
    burnerPortMm: 60,
    burnerKind: 'venturi',
    nominalKw: 22,
    burners: 1,
    fuel: 'propane',
    probe: 'K',
    timeZone: 'Europe/London',
    ...traits,
  });
}

/** A steady climb to the target and a hold, a reading a minute. */
export function steadyRows(targetCelsius = 1000, minutes = 30, holdMinutes = 4) {
  const rows: { minute: number; celsius: number }[] = [];
  for (let minute = 0; minute <= minutes; minute += 1) {
    rows.push({ minute, celsius: Math.round(15 + ((targetCelsius - 15) * minute) / minutes) });
  }
  for (let minute = 1; minute <= holdMinutes; minute += 1) {
    rows.push({ minute: minutes + minute, celsius: targetCelsius });
  }
  return rows;
}

/** A climb that levels off and is given up. */
export function stalledRows(levelCelsius = 700, climbMinutes = 28, stalledMinutes = 18) {
  const rows: { minute: number; celsius: number }[] = [];
  for (let minute = 0; minute <= climbMinutes; minute += 1) {
    rows.push({
      minute,
      celsius: Math.round(15 + ((levelCelsius - 15) * minute) / climbMinutes),
    });
  }
  for (let minute = 1; minute <= stalledMinutes; minute += 1) {
    rows.push({ minute: climbMinutes + minute, celsius: levelCelsius + (minute % 2) });
  }
  return rows;
}

export interface NoteTraits {
  title?: string;
  date?: string;
  stalledAt?: number | null;
  changes?: NoteFields['changes'];
  story?: string;
  overrides?: Partial<NoteFields>;
}

/** Fields that can be handed in: a plain firing to 1000 °C, or one that stalled. */
export function completeFields(kilnId: number, traits: NoteTraits = {}): NoteFields {
  const blank = emptyNoteFields();
  const { stalledAt = null } = traits;
  const stalled = stalledAt !== null;
  const rows = stalled ? stalledRows(stalledAt) : steadyRows();
  const lastMinute = rows.at(-1)?.minute ?? 0;
  return {
    ...blank,
    title: traits.title ?? 'A plain afternoon',
    kilnId,
    when: {
      ...blank.when,
      date: traits.date ?? '2026-05-02',
      startTime: '14:00',
      timeZone: 'Europe/London',
      unreportedFirings: 0,
      startClass: 'cold',
      startCelsius: 15,
    },
    plan: {
      ...blank.plan,
      drawnBecause: stalled ? 'gave-up' : 'temperature',
      targetBy: 'temperature',
      targetCelsius: 1000,
      peakBy: 'temperature',
      peakCelsius: stalled ? stalledAt : 1000,
      timeToTemperatureMinutes: stalled ? 46 : 30,
      noHold: stalled,
      holdKeptMinutes: stalled ? null : 4,
      holdPlannedMinutes: stalled ? null : 4,
    },
    record: {
      ...blank.record,
      typedRows: rows,
      marks: [
        { minute: 0, kind: 'lit', percent: null, detail: '' },
        { minute: lastMinute, kind: 'shut-off', percent: null, detail: '' },
      ],
    },
    pieces: [
      {
        key: 'a',
        form: 'bowl',
        count: 2,
        spanMm: 140,
        wallMm: 6,
        clay: 'grogged white',
        bisqueCone: '',
        bisqueCelsius: 1000,
        glazeName: 'River crackle',
        glazeFamily: 'crackle',
        dampness: 'dry',
        preheating: 'cold',
        kilnCelsiusAtLoading: null,
        lies: 'flat',
        targetCelsius: null,
        drawMinute: null,
        drawOrder: null,
        route: 'covered',
        recipe: null,
        melt: stalled ? 'under-fired' : 'matured',
        colour: stalled ? 'not' : 'as-hoped',
        bareClay: 'black',
        faults: [],
        cracked: false,
        cracks: [],
        whole: true,
        remark: '',
      },
    ],
    reduction: {
      ...blank.reduction,
      secondsInAir: 12,
      container: 'steel-bin',
      containerLitres: 40,
      combustibles: [
        { kind: 'sawdust', other: '', litres: 3, dampness: 'dry', placement: 'under' },
      ],
      litByTheWare: true,
      seal: 'lid',
      minutesCovered: 20,
      then: 'cooled',
    },
    result: { ...blank.result, troubles: stalled ? ['stall', 'dull-glaze'] : [] },
    changes: traits.changes ?? [],
    story: {
      type: 'doc',
      content: [
        {
          type: 'paragraph',
          content: [
            { type: 'text', text: traits.story ?? 'The flame was steady and the lid stayed on.' },
          ],
        },
      ],
    },
    cautionsRead: true,
    ...traits.overrides,
  };
}

const key = () => ({ headers: { 'Idempotency-Key': crypto.randomUUID() } });

export async function addKiln(client: Client, traits: Partial<KilnFields> = {}): Promise<Kiln> {
  const answer = await client.post('/api/kilns', { fields: kilnFields(traits) }, key());
  return answer.as(kilnSchema);
}

export async function startNote(client: Client, kilnId: number | null): Promise<Draft> {
  return (await client.post('/api/notes', { kilnId, triedNoteId: null }, key())).as(draftSchema);
}

export const ifMatch = (version: number) => ({ headers: { 'If-Match': `"v${String(version)}"` } });

export async function saveDraft(client: Client, draft: Draft, fields: NoteFields): Promise<Draft> {
  const path = `/api/notes/${String(draft.id)}/draft`;
  return (await client.put(path, { fields }, ifMatch(draft.version))).as(draftSchema);
}

/** Saves, answers every *look again* and hands in. */
export async function handIn(client: Client, draft: Draft, fields: NoteFields): Promise<Draft> {
  const first = await saveDraft(client, draft, fields);
  const answered = await saveDraft(client, first, {
    ...fields,
    checkAnswers: first.checks.map(({ code, pointer }) => ({
      code,
      pointer,
      answer: 'Looked again: it is so.',
    })),
  });
  const path = `/api/notes/${String(draft.id)}/hand-in`;
  return (await client.post(path, undefined, ifMatch(answered.version))).as(draftSchema);
}

/** A moderator takes it and decides. */
export async function decideOn(
  moderator: Client,
  noteId: number,
  decision: 'publish' | 'send-back' | 'decline',
  reason = '',
): Promise<void> {
  const path = `/api/desk/notes/${String(noteId)}`;
  const desk = (await moderator.put(`${path}/claim`)).as(deskNoteSchema);
  const answer = await moderator.post(`${path}/decision`, {
    decision,
    revisionId: desk.revisionId,
    reason,
    checklist: decision === 'publish' ? DESK_QUESTIONS : [],
  });
  if (answer.status !== 200) throw new Error(answer.text);
}

/** From nothing to a published note. @returns its id */
export async function publishedNote(
  author: Client,
  moderator: Client,
  kilnId: number,
  traits: NoteTraits = {},
): Promise<number> {
  const draft = await startNote(author, kilnId);
  await handIn(author, draft, completeFields(kilnId, traits));
  await decideOn(moderator, draft.id, 'publish');
  return draft.id;
}
