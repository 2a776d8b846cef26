import { deskNoteSchema, type DeskNote } from '#shared/api/desk.ts';
import { noteFieldsSchema } from '#shared/note/note-fields.ts';
import { kilnFields } from './notes.ts';

/** What a page is told of a note's fields. */
const PUBLIC_FIELDS = noteFieldsSchema.omit({
  story: true,
  checkAnswers: true,
  findingDisputes: true,
  record: true,
});

/** The row of a plain note. */
export function aNoteRow(over: object = {}) {
  return {
    id: 31,
    slug: 'a-stall-in-the-rain',
    title: 'A stall in the rain',
    author: { id: 9, name: 'Nell Ashby' },
    kiln: { id: 4, name: 'Old churn', volumeLitres: 48 },
    firedOn: '2026-06-01',
    publishedAt: '2026-06-03T10:00:00.000Z',
    strip: null,
    stripWords: 'No record was kept.',
    troubles: ['stall'],
    measuredTroubles: [],
    targetCelsius: 1000,
    peakCelsius: 702,
    timeToTemperatureMinutes: null,
    holdMinutes: null,
    stallCelsius: [702],
    crackedPieces: 0,
    pieces: 2,
    changes: [],
    followOn: null,
    ...over,
  };
}

/** A note handed in, on the desk of moderator 7. */
export function aDeskNote(over: Partial<DeskNote> = {}): DeskNote {
  return deskNoteSchema.parse({
    page: {
      id: 31,
      slug: 'a-stall-in-the-rain',
      status: 'on-the-desk',
      revision: 1,
      author: { id: 9, name: 'Nell Ashby' },
      kiln: { id: 4, version: 1, removed: false, fields: kilnFields(), volumeLitres: 48 },
      fields: PUBLIC_FIELDS.parse({ title: 'A stall in the rain', kilnId: 4 }),
      marks: [],
      row: aNoteRow(),
      findings: [],
      disputes: [],
      levelAnswers: [],
      summary: {
        peakCelsius: 702,
        targetCelsius: 1000,
        reached: false,
        aimCelsius: 1000,
        timeToTemperatureMinutes: null,
        holdMinutes: null,
        levels: [],
        sags: [],
        pieces: [],
        changes: null,
      },
      storyHtml: '<p>It rained, so we fired in the garage.</p>',
      pictures: [],
      hasRecord: false,
      publishedAt: null,
      revisedAt: null,
      revisionWaiting: false,
      earlier: null,
      next: null,
      followOn: null,
      triedNote: null,
      triedBy: [],
      abilities: {
        edit: false,
        handIn: false,
        takeBack: false,
        revise: false,
        remove: false,
        claim: true,
        takeDown: false,
        dispute: false,
        tryIt: false,
      },
    },
    revisionId: 77,
    status: 'on-the-desk',
    handedInAt: '2026-06-02T10:00:00.000Z',
    claim: { by: { id: 7, name: 'Marit Quell' }, until: '2026-06-02T12:00:00.000Z', mine: true },
    checks: [],
    findings: [],
    differences: null,
    storyBefore: null,
    unsafe: [],
    remarks: [],
    earlierDecisions: [],
    abilities: { decide: true, remark: true },
    ...over,
  });
}
