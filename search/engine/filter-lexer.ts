import { FilterSyntaxError } from './filter-syntax-error.ts';

export type FilterToken =
  | { kind: 'word'; text: string; at: number; end: number }
  | { kind: 'quoted'; text: string; at: number; end: number }
  | { kind: 'symbol'; text: string; at: number; end: number }
  | { kind: 'end'; text: ''; at: number; end: number };

const SYMBOLS = ['!=', '>=', '<=', '=', '>', '<', '(', ')', '[', ']', ','];
const WORD = /[\p{L}\p{N}_.\-/+*@$~:&%#°]/u;

function readQuoted(text: string, at: number): FilterToken {
  const quote = text[at];
  let value = '';
  for (let index = at + 1; index < text.length; index += 1) {
    const character = text[index] ?? '';
    if (character === '\\' && index + 1 < text.length) {
      const next = text[index + 1] ?? '';
      value += next === quote || next === '\\' ? next : character + next;
      index += 1;
    } else if (character === quote) {
      return { kind: 'quoted', text: value, at, end: index + 1 };
    } else {
      value += character;
    }
  }
  throw new FilterSyntaxError(
    `Expression \`${text.slice(at).replace(/\\/g, '\\\\')}\` is missing the following closing delimiter: \`${quote ?? ''}\`.`,
    at,
    text.length,
  );
}

/** Cuts a filter expression into words, quoted values and symbols, with offsets for messages. */
export function lexFilter(text: string): FilterToken[] {
  const tokens: FilterToken[] = [];
  let at = 0;
  while (at < text.length) {
    const character = text[at] ?? '';
    if (/\s/.test(character)) {
      at += 1;
      continue;
    }
    if (character === '"' || character === "'") {
      const token = readQuoted(text, at);
      tokens.push(token);
      at = token.end;
      continue;
    }
    const symbol = SYMBOLS.find((candidate) => text.startsWith(candidate, at));
    if (symbol !== undefined) {
      tokens.push({ kind: 'symbol', text: symbol, at, end: at + symbol.length });
      at += symbol.length;
      continue;
    }
    let end = at;
    for (;;) {
      const codePoint = text.codePointAt(end);
      if (codePoint === undefined) break;
      const letter = String.fromCodePoint(codePoint);
      if (!WORD.test(letter)) break;
      end += letter.length;
    }
    if (end === at) {
      throw new FilterSyntaxError(
        `Unexpected character \`${character}\` in the filter. Values with special characters must be quoted.`,
        at,
        at + 1,
      );
    }
    tokens.push({ kind: 'word', text: text.slice(at, end), at, end });
    at = end;
  }
  tokens.push({ kind: 'end', text: '', at: text.length, end: text.length });
  return tokens;
}
