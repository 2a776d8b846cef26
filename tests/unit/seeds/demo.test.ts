import { describe, expect, test } from 'vitest';
import { demo, type DemoFiring } from '../../../seeds/development/demo.ts';
import { allDrawings } from '../../../seeds/development/pictures/all-drawings.ts';
import { drawnPicture, notDrawnYet } from '../../../seeds/development/pictures/drawn-pictures.ts';
import { openChecks } from '#shared/note/checks/check.ts';
import { kilnFieldsSchema, type KilnFields } from '#shared/note/kiln-fields.ts';
import { noteFieldsSchema, type NoteFields } from '#shared/note/note-fields.ts';
import { readNote, type NoteReading } from '#shared/note/read-note.ts';
import { picturesIn, storyTexts } from '#shared/note/story.ts';
import { FORMS, ROUTES } from '#shared/vocabulary/ware.ts';
import { TROUBLE_IDS } from '#shared/vocabulary/troubles.ts';
import { cellsOf, type ReadFiring } from './demo-pairs.ts';

interface Read extends NoteReading {
  readonly firing: DemoFiring;
  readonly fields: NoteFields;
}

function kilnOf(firing: DemoFiring): KilnFields {
  return kilnFieldsSchema.parse(demo.kilns.find(({ key }) => key === firing.kilnKey)?.fields);
}

/** Reads every note as the server will, each against the kiln's earlier published one. */
function readAll(): Read[] {
  const last = new Map<string, NoteFields>();
  return demo.firings.map((firing) => {
    const fields = { ...noteFieldsSchema.parse(firing.fields), kilnId: 1 };
    const kiln = kilnOf(firing);
    const earlier = last.get(firing.kilnKey);
    if (firing.status === 'published') last.set(firing.kilnKey, fields);
    const note = readNote({
      fields,
      kiln,
      stored: firing.record,
      earlier: earlier ? { fields: earlier, kiln } : null,
      today: '2026-12-01',
    });
    return { ...note, firing, fields };
  });
}

const all = readAll();
const published = all.filter(({ firing }) => firing.status === 'published');
const withReading = published.flatMap(({ firing, fields, reading }): ReadFiring[] =>
  reading ? [{ firing, fields, reading }] : [],
);
const wordsOf = (fields: NoteFields): number =>
  storyTexts(fields.story)
    .filter(({ kind }) => kind !== 'caption')
    .reduce((sum, { text }) => sum + text.split(/\s+/).length, 0);

describe('the demo as a whole', () => {
  test('it has a dozen potters and one more, one admin, two moderators, and fifteen kilns', () => {
    expect(demo.people).toHaveLength(13);
    expect(demo.people.filter(({ role }) => role === 'admin')).toHaveLength(1);
    expect(demo.people.filter(({ role }) => role === 'moderator')).toHaveLength(2);
    expect(demo.kilns).toHaveLength(15);
    expect(new Set(demo.loans.map(({ kilnKey }) => kilnKey)).size).toBe(2);
  });

  test('every key is used once and points at somebody or something that exists', () => {
    for (const keys of [
      demo.people.map(({ key }) => key),
      demo.people.map(({ email }) => email),
      demo.kilns.map(({ key }) => key),
      demo.firings.map(({ key }) => key),
      demo.firings.map(({ fields }) => `${String(fields.title)} ${String(fields.when?.date)}`),
    ]) {
      expect(new Set(keys).size).toBe(keys.length);
    }
    const people = demo.people.map(({ key }) => key);
    const kilns = demo.kilns.map(({ key }) => key);
    const firings = demo.firings.map(({ key }) => key);
    expect(people).toEqual(expect.arrayContaining(demo.kilns.map(({ keeperKey }) => keeperKey)));
    expect(people).toEqual(expect.arrayContaining(demo.firings.map(({ authorKey }) => authorKey)));
    expect(kilns).toEqual(expect.arrayContaining(demo.firings.map(({ kilnKey }) => kilnKey)));
    const tried = demo.firings.flatMap(({ triedKey }) => triedKey ?? []);
    expect(tried.length).toBeGreaterThan(3);
    expect(firings).toEqual(expect.arrayContaining(tried));
  });

  test('whoever fires a kiln keeps it or has been lent it', () => {
    for (const { kilnKey, authorKey, key } of demo.firings) {
      const keeps = demo.kilns.some((kiln) => kiln.key === kilnKey && kiln.keeperKey === authorKey);
      const lent = demo.loans.some(
        (loan) => loan.kilnKey === kilnKey && loan.borrowerKey === authorKey,
      );
      expect(keeps || lent, key).toBe(true);
    }
  });

  test('the firings stand in order of time, and each note was published some days after', () => {
    for (const [index, { fields, publishedOn, status, key }] of demo.firings.entries()) {
      const date = fields.when?.date ?? '';
      const before = demo.firings[index - 1]?.fields.when?.date ?? '';
      expect(date >= before, key).toBe(true);
      expect(status === 'published', key).toBe(publishedOn !== null);
      if (publishedOn === null) continue;
      const days = (Date.parse(publishedOn) - Date.parse(date)) / 86_400_000;
      expect(days, key).toBeGreaterThanOrEqual(1);
      expect(days, key).toBeLessThanOrEqual(14);
      expect(publishedOn <= '2026-12-01', key).toBe(true);
    }
  });

  test('a note is tried only by firings after it was published', () => {
    for (const { key, triedKey, fields } of demo.firings) {
      if (triedKey === null) continue;
      const tried = demo.firings.find((other) => other.key === triedKey);
      expect((tried?.publishedOn ?? '9999') <= (fields.when?.date ?? ''), key).toBe(true);
    }
  });

  test('there are drafts, notes at the desk, returned notes and a declined one', () => {
    const count = (status: string) => all.filter(({ firing }) => firing.status === status).length;
    expect(count('draft')).toBe(3);
    expect(count('handed-in')).toBe(3);
    expect(count('sent-back')).toBe(2);
    expect(count('declined')).toBe(1);
    const returned = demo.firings.filter(({ status }) => status === 'sent-back');
    expect(returned.every(({ remarks }) => remarks.length > 0)).toBe(true);
    expect(demo.firings.find(({ status }) => status === 'declined')?.reason).toBeTruthy();
    const waiting = all.filter(({ firing }) => firing.status === 'handed-in');
    const levelled = waiting.flatMap(({ reading }) => reading?.levels ?? []);
    expect(
      levelled.some(
        ({ kind, levelCelsius }) => kind === 'stall' && Math.abs(levelCelsius - 700) < 12,
      ),
    ).toBe(true);
  });

  test('all but two troubles and every route and form in common use are met with', () => {
    const troubles = new Set(published.flatMap(({ fields }) => fields.result.troubles));
    expect(TROUBLE_IDS.filter((trouble) => !troubles.has(trouble))).toEqual([
      'burn-back',
      'wrong-reading',
    ]);
    const pieces = published.flatMap(({ fields }) => fields.pieces);
    const routes = new Set(pieces.map(({ route }) => route));
    expect(Object.keys(ROUTES).filter((route) => !routes.has(route as never))).toEqual([
      'crackle-then-smoked',
    ]);
    const forms = new Set(pieces.map(({ form }) => form));
    expect(Object.keys(FORMS).filter((form) => !forms.has(form as never))).toEqual(['box', 'bead']);
  });
});

describe('each note of the demo', () => {
  test.each(all.filter(({ firing }) => firing.status !== 'draft'))(
    '$firing.key asks its author nothing any more',
    ({ checks, fields }) => {
      expect(openChecks(checks, fields.checkAnswers)).toEqual([]);
      expect(checks.filter(({ forModerators }) => forModerators)).toEqual([]);
    },
  );

  test('an answer is given only where something was asked', () => {
    for (const { checks, fields, firing } of all) {
      for (const { code, pointer } of fields.checkAnswers) {
        expect(
          checks.some((check) => check.code === code && check.pointer === pointer),
          firing.key,
        ).toBe(true);
      }
    }
  });

  test('where the words name a level, the record stalls there', () => {
    const said = all.flatMap(({ firing, reading }) => {
      const celsius = firing.told.says?.stallCelsius;
      return celsius === undefined
        ? []
        : [{ key: firing.key, celsius, reading, story: firing.fields.story }];
    });
    expect(said.length).toBeGreaterThan(30);
    for (const { key, celsius, reading } of said) {
      const levels = (reading?.levels ?? [])
        .filter(({ kind }) => kind === 'stall')
        .map(({ levelCelsius }) => levelCelsius);
      expect(
        Math.min(...levels.map((level) => Math.abs(level - celsius))),
        key,
      ).toBeLessThanOrEqual(6);
    }
  });

  test('where the words name a fall, the record falls so', () => {
    for (const { firing, reading } of all) {
      const { sagFrom, sagTo } = firing.told.says ?? {};
      if (sagFrom === undefined || sagTo === undefined) continue;
      expect(reading?.sags).toHaveLength(1);
      expect(Math.abs((reading?.sags[0]?.topCelsius ?? 0) - sagFrom)).toBeLessThanOrEqual(10);
      expect(Math.abs((reading?.sags[0]?.bottomCelsius ?? 0) - sagTo)).toBeLessThanOrEqual(10);
    }
  });

  test('at least fifty-two tell a whole story, the others jot, and no two tell the same', () => {
    const words = published.map(({ fields }) => wordsOf(fields));
    expect(words.filter((count) => count >= 120).length).toBeGreaterThanOrEqual(52);
    expect(Math.min(...words)).toBeGreaterThanOrEqual(25);
    const paragraphs = published.flatMap(({ fields }) =>
      storyTexts(fields.story)
        .filter(({ kind }) => kind !== 'heading' && kind !== 'caption')
        .map(({ text }) => text),
    );
    expect(new Set(paragraphs).size).toBe(paragraphs.length);
  });
});

describe('the evidence in the demo', () => {
  type Cells = ReturnType<typeof cellsOf>;
  const cell = (cells: Cells, change: Parameters<Cells['get']>[0]) =>
    cells.get(change) ?? { pairs: 0, gone: 0, members: 0 };

  test.each([
    ['stall', 'floor-insulated', 0.75, 1],
    ['stall', 'burner-more-sweeping', 0.75, 1],
    ['stall', 'flue-more-open', 0, 0.5],
    ['stall', 'gas-more', 0, 0.2],
    ['stall', 'none', 0.1, 0.5],
    ['sag', 'wind-shelter', 0.75, 1],
    ['crack-in-firing', 'slower-start', 0.75, 1],
    ['weak-reduction', 'combustible-more', 0, 0.34],
  ] as const)(
    '%s, then %s: six pairs of three members, gone in %d to %d',
    (trouble, change, low, high) => {
      const { pairs, gone, members } = cell(cellsOf(trouble, withReading), change);
      expect(pairs).toBeGreaterThanOrEqual(6);
      expect(members).toBeGreaterThanOrEqual(3);
      expect(gone / pairs).toBeGreaterThanOrEqual(low);
      expect(gone / pairs).toBeLessThanOrEqual(high);
    },
  );

  test('some stalls were cured during the firing, after a mark', () => {
    const wentOn = withReading.filter(({ fields, reading }) =>
      reading.levels.some(
        ({ kind, toMinute, then }) =>
          kind === 'stall' &&
          then === 'climbed' &&
          fields.record.marks.some(
            ({ kind: mark, minute }) => mark !== 'gust' && Math.abs(minute - toMinute) < 10,
          ),
      ),
    );
    expect(new Set(wentOn.map(({ firing }) => firing.authorKey)).size).toBeGreaterThanOrEqual(3);
  });
});

describe('the pictures of the demo', () => {
  const drawings = allDrawings();

  test('at least twenty-eight are drawn, all different, and each says that it is a drawing', () => {
    expect(drawings.length).toBeGreaterThanOrEqual(28);
    expect(new Set(drawings.map(({ key }) => key)).size).toBe(drawings.length);
    expect(new Set(drawings.map(({ svg }) => svg)).size).toBe(drawings.length);
    expect(drawings.every(({ svg }) => svg.includes('>drawing</text>'))).toBe(true);
  });

  test('the files lie drawn as the drawings are now', () => {
    expect(notDrawnYet().map(({ key }) => key)).toEqual([]);
    for (const { key } of drawings)
      expect(drawnPicture(key).subarray(0, 2).toString('hex')).toBe('ffd8');
  });

  test('the same seed draws the same picture', () => {
    expect(allDrawings().map(({ svg }) => svg)).toEqual(drawings.map(({ svg }) => svg));
  });

  test('every drawing is shown, every picture shown is drawn, and its caption says what it is', () => {
    const shown = new Set(demo.firings.flatMap(({ pictures }) => pictures.map(({ key }) => key)));
    expect([...shown].sort()).toEqual(drawings.map(({ key }) => key).sort());
    for (const { fields, firing } of all) {
      expect(picturesIn(fields.story)).toEqual(firing.pictures.map(({ name }) => name));
      for (const { type, attrs } of fields.story.content) {
        if (type === 'picture') expect(attrs?.['caption']).toMatch(/^Drawing: /);
      }
    }
  });
});
