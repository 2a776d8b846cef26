import { describe, expect, it } from 'vitest';
import {
  minuteCell,
  percentCell,
  temperatureCell,
} from '../../../../src/write/record/typed-cells.ts';

describe('a minute’s cell', () => {
  it('reads minutes, and hours and minutes', () => {
    expect(minuteCell.read('12,5')).toEqual({ kind: 'number', value: 12.5 });
    expect(minuteCell.read('1:05')).toEqual({ kind: 'number', value: 65 });
    expect(minuteCell.read('0:00:30')).toEqual({ kind: 'number', value: 0.5 });
    expect(minuteCell.read(' ')).toEqual({ kind: 'blank' });
  });

  it('does not take what the note could not keep', () => {
    expect(minuteCell.read('1:75').kind).toBe('unreadable');
    expect(minuteCell.read('about ten').kind).toBe('unreadable');
    expect(minuteCell.read('20161').kind).toBe('unreadable');
    expect(minuteCell.read('-1440')).toEqual({ kind: 'number', value: -1440 });
  });
});

describe('a temperature’s cell', () => {
  it('keeps °C of what is typed in the member’s unit, and shows it back unchanged', () => {
    const fahrenheit = temperatureCell('F');
    // 1010 °C is 1850 °F by definition of the scales.
    expect(fahrenheit.read('1850')).toEqual({ kind: 'number', value: 1010 });
    expect(fahrenheit.write(1010)).toBe('1850');
    const read = fahrenheit.read('1839');
    expect(fahrenheit.write(read.kind === 'number' ? read.value : null)).toBe('1839');
    expect(temperatureCell('C').read('712,4')).toEqual({ kind: 'number', value: 712.4 });
  });

  it('asks back what no probe shows', () => {
    expect(temperatureCell('C').read('99999').kind).toBe('unreadable');
  });
});

describe('a flue’s cell', () => {
  it('takes 0 to 100 per cent', () => {
    expect(percentCell.read('0')).toEqual({ kind: 'number', value: 0 });
    expect(percentCell.read('101').kind).toBe('unreadable');
  });
});
