import { describe, expect, it } from 'vitest';
import { isSafeLink } from '#shared/note/story.ts';
import { completeAddress } from '../../../../src/write/story/complete-address.ts';

describe('a typed address', () => {
  it('gets the https:// or mailto: that people leave out', () => {
    expect(completeAddress(' example.org/glaze ')).toBe('https://example.org/glaze');
    expect(completeAddress('potter@example.org')).toBe('mailto:potter@example.org');
    expect(completeAddress('//example.org')).toBe('https://example.org');
    expect(completeAddress('http://example.org')).toBe('http://example.org');
  });

  it('of another kind stays what it is, and is refused', () => {
    expect(completeAddress('javascript:alert(1)')).toBe('javascript:alert(1)');
    expect(isSafeLink(completeAddress('javascript:alert(1)'))).toBe(false);
    expect(isSafeLink(completeAddress(''))).toBe(false);
  });
});
