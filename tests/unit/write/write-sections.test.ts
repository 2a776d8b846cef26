import { describe, expect, it } from 'vitest';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { pointersUpwards } from '../../../src/write/go-to-field.ts';
import { countBySection, sectionOf } from '../../../src/write/write-sections.ts';

describe('the sections of the form', () => {
  it('give every member of a note its place', () => {
    const homeless = Object.keys(emptyNoteFields()).filter(
      (name) => sectionOf(`/${name}`) === null,
    );
    expect(homeless).toEqual([]);
  });

  it('count what each still asks, by where the fields stand', () => {
    const counts = countBySection(['/plan/peakCelsius', '/pieces/0/form', '/pieces', '/title', '']);
    expect([...counts]).toEqual([
      ['plan', 1],
      ['pieces', 2],
      ['story', 1],
    ]);
  });
});

describe('the way to a field', () => {
  it('falls back from the field to its row and its group', () => {
    expect(pointersUpwards('/pieces/2/spanMm')).toEqual([
      '/pieces/2/spanMm',
      '/pieces/2',
      '/pieces',
    ]);
  });
});
