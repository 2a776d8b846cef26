import { describe, expect, it } from 'vitest';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { columnsUnder, withinColumns } from '../../../../src/write/record/choice-columns.ts';

const text = 'made by a logger\nTime;Kiln;Room\n# a comment\n0;20;17\n1;35;17\n';

describe('the columns of a table', () => {
  it('fall anew with another delimiter or another line of names', () => {
    expect(columnsUnder(text, { delimiter: ';', headerLine: 2 })).toEqual([
      { index: 0, name: 'Time', samples: ['0', '1'] },
      { index: 1, name: 'Kiln', samples: ['20', '35'] },
      { index: 2, name: 'Room', samples: ['17', '17'] },
    ]);
    expect(columnsUnder(text, { delimiter: ',', headerLine: 2 })).toHaveLength(1);
  });

  it('that are there no more are not chosen any longer', () => {
    const choice: RecordChoice = {
      delimiter: ';',
      decimal: '.',
      headerLine: null,
      timeColumn: 3,
      timeFormat: 'minutes',
      temperatureColumn: 4,
      secondColumn: 5,
      unit: 'C',
    };
    expect(withinColumns(choice, 2)).toMatchObject({
      timeColumn: 0,
      temperatureColumn: 1,
      secondColumn: null,
    });
    expect(withinColumns(choice, 6)).toEqual(choice);
  });
});
