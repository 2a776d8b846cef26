import { roundTo } from '#shared/units/number.ts';

export type TypedNumber =
  | { readonly kind: 'blank' }
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'unreadable'; readonly because: string };

/**
 * Reads a number as people type it: comma or point as decimal sign, spaces between thousands, any
 * minus sign. Blank is not zero. "1,850" may be 1850 or 1.85, so it is asked back, not guessed.
 */
export function readTypedNumber(text: string): TypedNumber {
  const tidy = text.replace(/[\s\u00a0\u202f']/g, '').replace(/[−–]/g, '-');
  if (tidy === '') return { kind: 'blank' };
  const grouped = /^-?([1-9]\d{0,2}),(\d{3})$/.exec(tidy);
  if (grouped) {
    const [, whole = '', rest = ''] = grouped;
    return { kind: 'unreadable', because: `Write ${whole}${rest} or ${whole}.${rest}.` };
  }
  if (!/^-?(\d+([.,]\d*)?|[.,]\d+)$/.test(tidy)) {
    return { kind: 'unreadable', because: 'Write a number, such as 12 or 12.5.' };
  }
  return { kind: 'number', value: Number(tidy.replace(',', '.')) };
}

/** A number as it stands in a field: a point, no trailing noughts, nothing for none. */
export function writeTypedNumber(value: number | null, decimals: number): string {
  return value === null || !Number.isFinite(value) ? '' : String(roundTo(value, decimals));
}
