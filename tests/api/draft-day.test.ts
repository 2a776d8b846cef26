import { describe, expect } from 'vitest';
import { test } from '../support/api.ts';
import { addKiln, completeFields, saveDraft, startNote } from '../support/notes.ts';

const todayIn = (timeZone: string): string =>
  new Intl.DateTimeFormat('en-CA', { timeZone }).format(new Date());

describe('the day of a firing', () => {
  test('is one to come, or not, by the clock where the kiln stands', async ({ api }) => {
    const author = await api.signedIn();
    const kiln = await addKiln(author);
    let draft = await startNote(author, kiln.id);
    const isToCome = async (timeZone: string, date: string): Promise<boolean> => {
      const fields = completeFields(kiln.id, { date });
      draft = await saveDraft(author, draft, { ...fields, when: { ...fields.when, timeZone } });
      return draft.checks.some(({ code }) => code === 'date-in-future');
    };
    // Their clocks are 25 hours apart: on any day one of them is not Greenwich's.
    const [east, west] = ['Pacific/Kiritimati', 'Pacific/Pago_Pago'];
    expect(todayIn(east) > todayIn(west)).toBe(true);
    expect(await isToCome(east, todayIn(east))).toBe(false);
    expect(await isToCome(west, todayIn(east))).toBe(true);
    expect(await isToCome(west, todayIn(west))).toBe(false);
  });
});
