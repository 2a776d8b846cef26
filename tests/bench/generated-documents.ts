import { CHANGE_IDS } from '#shared/vocabulary/changes.ts';
import { FUEL_IDS, WEATHERS, WINDS } from '#shared/vocabulary/kiln.ts';
import { idsOf } from '#shared/vocabulary/terms.ts';
import { CAUSE_IDS, CAUSES, TROUBLE_IDS, TROUBLES } from '#shared/vocabulary/troubles.ts';
import { FORM_FAMILY_IDS } from '#shared/vocabulary/ware.ts';
import { GLAZES_ASKED } from '#shared/question/reading-types.ts';
import { KILN_SIZES, type NoteDocument } from '../../search/note-document.ts';
import { createTextMaker } from '../../seeds/many/told-text.ts';
import { seededRandom } from '../../seeds/simulation/seeded-random.ts';

/** Documents as the index holds them, the same for the same seed; of about 200 words each. */
export function* generatedDocuments(count: number, seed = 1): Iterable<NoteDocument> {
  const random = seededRandom(seed);
  const text = createTextMaker(random);
  const whole = (from: number, to: number): number => from + Math.floor(random() * (to - from + 1));
  const oneOf = <T>(list: readonly T[]): T => {
    const picked = list[Math.floor(random() * list.length)];
    if (picked === undefined) throw new Error('An empty list.');
    return picked;
  };
  const some = <T>(list: readonly T[], most: number): T[] => [
    ...new Set(Array.from({ length: whole(0, most) }, () => oneOf(list))),
  ];
  const glazeIds = idsOf(GLAZES_ASKED);
  for (let id = 1; id <= count; id += 1) {
    const troubles = some(TROUBLE_IDS, 2);
    const causes = some(CAUSE_IDS, 2);
    const stalled = troubles.includes('stall');
    yield {
      id: String(id),
      noteId: id,
      title: text.words(whole(4, 9)),
      inShort: text.sentences(30),
      story: text.sentences(whole(100, 200)),
      pieceRemarks: random() < 0.3 ? text.sentences(8) : '',
      troubles,
      measuredTroubles: troubles.slice(0, 1),
      namedTroubles: troubles.slice(1),
      troubleWords: troubles.map((trouble) => TROUBLES[trouble]),
      causeWords: causes.map((cause) => CAUSES[cause]),
      causes,
      changes: some(CHANGE_IDS, 2),
      nextChanges: some(CHANGE_IDS, 1),
      outcome: oneOf([0, 1, 2, 3] as const),
      forms: some(FORM_FAMILY_IDS, 2),
      clays: [`Clay ${text.word()}`],
      glazes: some(glazeIds, 2),
      glazeNames: [text.words(2)],
      fuel: oneOf(FUEL_IDS),
      kilnSize: oneOf(idsOf(KILN_SIZES)),
      stallC: stalled ? [whole(450, 950)] : [],
      sagC: random() < 0.1 ? [whole(500, 950)] : [],
      eventC: [],
      peakC: whole(650, 1060),
      aimC: whole(900, 1050),
      minutesToPeak: whole(18, 120),
      holdMinutes: whole(0, 15),
      crossingRatePerMin: whole(5, 60),
      cracks: whole(0, 2),
      widestCm: whole(6, 45),
      wind: oneOf(idsOf(WINDS)),
      weather: oneOf(idsOf(WEATHERS)),
      authorName: `Potter ${text.word()} ${String(id % 997)}`,
      kilnName: `Kiln ${text.word()} ${String(id % 1499)}`,
      firedOn: whole(18_000, 20_700),
      publishedAt: 1_600_000_000 + id * 60,
    };
  }
}
