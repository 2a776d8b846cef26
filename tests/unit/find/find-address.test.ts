import { describe, expect, it } from 'vitest';
import { findQuerySchema } from '#shared/api/search.ts';
import {
  readFindAddress,
  searchOf,
  tickedCount,
  withRange,
  withFacetToggled,
  withPartToggled,
  writeFindAddress,
} from '../../../src/find/find-address.ts';

const read = (text: string) => readFindAddress(new URLSearchParams(text));

describe('the address of a search', () => {
  it('is the same after being read and written again', () => {
    const text = 'q=stalled+at+700&off=temperature&forms=plate%2Cbowl&sort=newest&page=3';
    expect(writeFindAddress(read(text))).toBe(text);
  });

  it('takes what makes no sense as if it were not there', () => {
    const address = read('q=+stall+&sort=prettiest&page=-2&colour=red&off=,,a,a');
    expect(address).toEqual({
      q: 'stall',
      off: ['a'],
      sort: 'best',
      page: 1,
      facets: {},
      ranges: {},
    });
  });

  it.each(['0', '51', '1.5e9', 'NaN', ''])('reads page "%s" as the first', (page) => {
    expect(read(`page=${page}`).page).toBe(1);
  });

  it('asks the server only what its schema takes, whatever stands in the address', () => {
    const long = 'x'.repeat(400);
    const asked = searchOf(read(`q=${long}&page=7&forms=cup&nonsense=1&sort=nearest`));
    const parsed = findQuerySchema.parse(Object.fromEntries(new URLSearchParams(asked)));
    expect(parsed).toMatchObject({ page: 7, forms: 'cup', sort: 'nearest' });
    expect(parsed.q).toHaveLength(300);
  });

  it('asks an empty question for the newest notes', () => {
    expect(searchOf(read('off=temperature'))).toBe('sort=newest');
  });

  it('switches a part off and takes it in again, from the first page', () => {
    const off = withPartToggled(read('q=stall&page=4'), 'trouble:stall');
    expect(off).toMatchObject({ off: ['trouble:stall'], page: 1 });
    expect(withPartToggled(off, 'trouble:stall').off).toEqual([]);
  });

  it('keeps ranges with one end or two, and drops what is none', () => {
    const text = 'q=stall&stall=690..740&peak=..1000&hold=5..';
    expect(writeFindAddress(read(text))).toBe(text);
    expect(read('peak=..&hold=a..b&climb=5&crossing=-1..2').ranges).toEqual({});
    expect(tickedCount(read(text))).toBe(3);
  });

  it('turns a range that is the wrong way round, and takes an open one away', () => {
    const set = withRange(read('q=stall&page=3'), 'peak', { min: 1000, max: 900.5 });
    expect(writeFindAddress(set)).toBe('q=stall&peak=900.5..1000');
    expect(writeFindAddress(withRange(set, 'peak', { min: null, max: null }))).toBe('q=stall');
    const asked = findQuerySchema.parse(Object.fromEntries(new URLSearchParams(searchOf(set))));
    expect(asked.peak).toBe('900.5..1000');
  });

  it('ticks filters, counts them, and takes a tick away', () => {
    const one = withFacetToggled(read('q=stall&page=2'), 'forms', 'plate');
    const two = withFacetToggled(one, 'fuel', 'propane');
    expect(tickedCount(two)).toBe(2);
    expect(two.page).toBe(1);
    expect(writeFindAddress(withFacetToggled(two, 'forms', 'plate'))).toBe('q=stall&fuel=propane');
  });
});
