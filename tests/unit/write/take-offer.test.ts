import { describe, expect, it } from 'vitest';
import { checkNote } from '#shared/note/checks/check-note.ts';
import { openChecks } from '#shared/note/checks/check.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { answerCheck, takeOffer } from '../../../src/write/take-offer.ts';

const blank = emptyNoteFields();
const asked = (fields: NoteFields) =>
  checkNote({
    fields,
    kiln: null,
    reading: null,
    hasRecord: false,
    earlier: null,
    today: '2026-06-01',
  });

describe('taking what a check offers', () => {
  it('mends 1850 typed as °C to 1010 °C with one press', () => {
    const fields: NoteFields = {
      ...blank,
      plan: { ...blank.plan, targetBy: 'temperature', targetCelsius: 1850 },
    };
    const check = asked(fields).find(({ code }) => code === 'fahrenheit-as-celsius');
    if (!check?.offer) throw new Error('The check makes no offer.');
    const mended = takeOffer(fields, check.offer);
    expect(mended.plan.targetCelsius).toBe(1010);
    expect(asked(mended).some(({ code }) => code === 'fahrenheit-as-celsius')).toBe(false);
  });

  it('leaves everything as it is when the offer names no field or a value it cannot hold', () => {
    expect(takeOffer(blank, { pointer: '/plan/nothing', value: 1 })).toEqual(blank);
    expect(takeOffer(blank, { pointer: '/plan/noHold', value: 'perhaps' })).toBe(blank);
    expect(takeOffer(blank, { pointer: '/pieces/4/spanMm', value: 10 })).toEqual(blank);
  });
});

describe('answering a check', () => {
  const fields: NoteFields = {
    ...blank,
    when: { ...blank.when, startClass: 'cold', startCelsius: 200 },
  };
  const check = asked(fields).find(({ code }) => code === 'start-class-disagrees');
  if (!check) throw new Error('The check is not asked.');
  const isOpen = (now: NoteFields) => openChecks([check], now.checkAnswers).length === 1;

  it('settles a look-again, and one answer replaces the other', () => {
    const once = answerCheck(fields, check, 'The probe');
    const twice = answerCheck(once, check, 'The probe was still warm.');
    expect(isOpen(fields)).toBe(true);
    expect(isOpen(twice)).toBe(false);
    expect(twice.checkAnswers).toHaveLength(1);
  });

  it('is taken back by leaving it blank', () => {
    const answered = answerCheck(fields, check, 'So it was.');
    expect(answerCheck(answered, check, '').checkAnswers).toEqual([]);
  });
});
