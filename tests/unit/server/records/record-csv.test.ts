import { describe, expect, it } from 'vitest';
import { markSchema } from '#shared/note/plan.ts';
import { detectTable } from '#shared/record/detect-table.ts';
import { readTable } from '#shared/record/read-table.ts';
import { recordCsv } from '../../../../server/records/record-csv.ts';

const climb = (offset: number, every = 1) =>
  Array.from({ length: 24 }, (_, index) => index)
    .filter((index) => index % every === 0)
    .map((index) => ({ minute: index / 2, celsius: 20 + index * 40 + offset }));

describe('recordCsv', () => {
  it('is minutes and degrees alone where there is one probe and no mark', () => {
    const csv = recordCsv({ readings: climb(0).slice(0, 3), secondProbe: null }, []);
    expect(csv).toBe('minute,celsius\r\n0,20\r\n0.5,60\r\n1,100\r\n');
  });

  it('has a column for the second probe, blank where only one of the two was read', () => {
    const csv = recordCsv(
      {
        readings: climb(0).slice(0, 3),
        secondProbe: [
          { minute: 0.5, celsius: 51.2 },
          { minute: 0.75, celsius: 60 },
        ],
      },
      [],
    );
    expect(csv.split('\r\n')).toEqual([
      'minute,probe 1 celsius,probe 2 celsius',
      '0,20,',
      '0.5,60,51.2',
      '0.75,,60',
      '1,100,',
      '',
    ]);
  });

  it('loses no reading where several stand at the same minute', () => {
    const twice = [
      { minute: 1, celsius: 10 },
      { minute: 1, celsius: 11 },
    ];
    const other = [...twice, { minute: 1, celsius: 12 }];
    const rows = recordCsv({ readings: twice, secondProbe: other }, []).trim().split('\r\n');
    expect(rows.slice(1)).toEqual(['1,10,10', '1,11,11', '1,,12']);
  });

  it('says what was done when, without what could be taken for a formula', () => {
    const marks = [
      { minute: 0.75, kind: 'flue-closed', percent: 40, detail: '=HYPERLINK("x")' },
      { minute: -2, kind: 'lit' },
    ].map((mark) => markSchema.parse(mark));
    const csv = recordCsv({ readings: climb(0).slice(0, 3), secondProbe: null }, marks);
    expect(csv.trim().split('\r\n')).toEqual([
      'minute,celsius,mark',
      '-2,,Lit',
      '0,20,',
      '0.5,60,',
      '0.75,,Flue closed 40 %',
      '1,100,',
    ]);
  });

  it('can be read back: both probes, every reading, whatever the marks', () => {
    const content = { readings: climb(0), secondProbe: climb(-7, 2) };
    const marks = [3.25, 6].map((minute) => markSchema.parse({ minute, kind: 'gas-up' }));
    for (const one of [content, { ...content, secondProbe: null }]) {
      for (const some of [marks, []]) {
        const csv = recordCsv(one, some);
        const read = readTable(csv, detectTable(csv).choice);
        expect(read.readings).toEqual(one.readings);
        expect(read.secondProbe).toEqual(one.secondProbe);
      }
    }
  });
});
