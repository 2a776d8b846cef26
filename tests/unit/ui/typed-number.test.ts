import { describe, expect, it } from 'vitest';
import { readTypedNumber, writeTypedNumber } from '../../../src/ui/typed-number.ts';

describe('readTypedNumber', () => {
  it.each([
    ['12', 12],
    ['12,5', 12.5],
    ['12.5', 12.5],
    [' −20 ', -20],
    ['1 850', 1850],
    ['.5', 0.5],
    ['7.', 7],
    ['0', 0],
    ['0,125', 0.125],
  ])('reads %j as %d', (text, value) => {
    expect(readTypedNumber(text)).toEqual({ kind: 'number', value });
  });

  it('tells blank from nought', () => {
    expect(readTypedNumber('')).toEqual({ kind: 'blank' });
    expect(readTypedNumber('  ')).toEqual({ kind: 'blank' });
    expect(readTypedNumber('0')).not.toEqual({ kind: 'blank' });
  });

  it('asks back where a comma may part thousands or decimals', () => {
    expect(readTypedNumber('1,850')).toEqual({
      kind: 'unreadable',
      because: 'Write 1850 or 1.850.',
    });
  });

  it.each(['twelve', '12 bar', '1.2.3', '-', '1e3', 'Infinity'])('does not guess at %j', (text) => {
    expect(readTypedNumber(text).kind).toBe('unreadable');
  });
});

describe('writeTypedNumber', () => {
  it('writes what was stored, to so many decimals, and nothing for none', () => {
    expect(writeTypedNumber(12.5, 3)).toBe('12.5');
    expect(writeTypedNumber(1839.2000000000003, 1)).toBe('1839.2');
    expect(writeTypedNumber(0, 1)).toBe('0');
    expect(writeTypedNumber(null, 1)).toBe('');
  });
});
