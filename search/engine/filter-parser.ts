import { lexFilter, type FilterToken } from './filter-lexer.ts';
import { FilterSyntaxError } from './filter-syntax-error.ts';

export type Comparison = '=' | '!=' | '>' | '>=' | '<' | '<=';

export type FilterCondition =
  | { kind: 'compare'; operator: Comparison; value: string }
  | { kind: 'between'; from: string; to: string }
  | { kind: 'in'; values: string[] }
  | { kind: 'exists' }
  | { kind: 'null' }
  | { kind: 'empty' }
  | { kind: 'startsWith'; value: string };

/** `span` is the stretch of the expression a condition was read from, for error messages. */
export type FilterNode =
  | { kind: 'and' | 'or'; parts: FilterNode[] }
  | { kind: 'not'; part: FilterNode }
  | { kind: 'condition'; attribute: string; span: [number, number]; condition: FilterCondition };

/** Deeper nesting is refused, so that no filter can exhaust the stack. */
const MAX_DEPTH = 100;
const MAX_EXPRESSION_LENGTH = 100_000;

const KEYWORDS = new Set([
  'AND',
  'OR',
  'NOT',
  'TO',
  'IN',
  'IS',
  'EXISTS',
  'EMPTY',
  'NULL',
  'CONTAINS',
  'STARTS',
  'WITH',
]);
const COMPARISONS: readonly Comparison[] = ['=', '!=', '>', '>=', '<', '<='];

/**
 * Reads one filter expression. Precedence, loosest first: OR, AND, NOT, brackets. Throws
 * FilterSyntaxError with the offending stretch.
 */
export function parseFilterExpression(text: string): FilterNode {
  if (text.length > MAX_EXPRESSION_LENGTH) {
    throw new FilterSyntaxError('The filter expression is too long.', 0, text.length);
  }
  const tokens = lexFilter(text);
  let at = 0;
  let depth = 0;

  const peek = (ahead = 0): FilterToken =>
    tokens[Math.min(at + ahead, tokens.length - 1)] ?? { kind: 'end', text: '', at: 0, end: 0 };
  const isKeyword = (keyword: string, ahead = 0): boolean =>
    peek(ahead).kind === 'word' && peek(ahead).text === keyword;
  const isSymbol = (symbol: string): boolean => peek().kind === 'symbol' && peek().text === symbol;

  function fail(message: string): never {
    const token = peek();
    throw new FilterSyntaxError(message, token.at, Math.max(token.end, text.length));
  }

  function nested<T>(read: () => T): T {
    depth += 1;
    if (depth > MAX_DEPTH) {
      throw new FilterSyntaxError(
        `The filter exceeded the maximum depth limit. Try rewriting the filter so that it contains fewer nested conditions.`,
        0,
        text.length,
      );
    }
    const result = read();
    depth -= 1;
    return result;
  }

  function readList(word: 'OR' | 'AND', readPart: () => FilterNode): FilterNode {
    const first = readPart();
    if (!isKeyword(word)) return first;
    const parts = [first];
    while (isKeyword(word)) {
      at += 1;
      parts.push(readPart());
    }
    return { kind: word === 'OR' ? 'or' : 'and', parts };
  }

  const readOr = (): FilterNode => readList('OR', readAnd);
  const readAnd = (): FilterNode => readList('AND', readNot);

  function readNot(): FilterNode {
    if (isKeyword('NOT')) {
      at += 1;
      return { kind: 'not', part: nested(readNot) };
    }
    if (isSymbol('(')) {
      const open = peek();
      at += 1;
      const inner = nested(readOr);
      if (!isSymbol(')')) {
        throw new FilterSyntaxError(
          `Expression \`${text.slice(open.at)}\` is missing the following closing delimiter: \`)\`.`,
          open.at,
          text.length,
        );
      }
      at += 1;
      return inner;
    }
    return readCondition();
  }

  function readValue(what: string): string {
    const token = peek();
    if (token.kind === 'quoted' || (token.kind === 'word' && !KEYWORDS.has(token.text))) {
      at += 1;
      return token.text;
    }
    if (token.kind === 'word') {
      return fail(
        `Was expecting ${what} but instead got \`${token.text}\`, which is a reserved keyword. To use \`${token.text}\` as a field name or a value, surround it by quotes.`,
      );
    }
    return fail(
      token.kind === 'end'
        ? `Was expecting ${what} but instead got nothing.`
        : `Was expecting ${what} but instead got \`${text.slice(token.at)}\`.`,
    );
  }

  function readValueList(): string[] {
    if (!isSymbol('[')) return fail('Expected `[` after `IN` keyword.');
    at += 1;
    const values: string[] = [];
    while (!isSymbol(']')) {
      values.push(readValue('a value'));
      if (isSymbol(',')) at += 1;
      else if (!isSymbol(']')) {
        return fail('Expected only comma-separated field names inside `IN[..]`, closed by `]`.');
      }
    }
    at += 1;
    return values;
  }

  /** The condition after the attribute; `negated` stands for a NOT inside it. */
  function readOperator(): { condition: FilterCondition; negated: boolean } {
    const token = peek();
    if (token.kind === 'symbol') {
      const operator = COMPARISONS.find((candidate) => candidate === token.text);
      if (operator !== undefined) {
        at += 1;
        const value = readValue('a value');
        return { condition: { kind: 'compare', operator, value }, negated: false };
      }
    }
    if (isKeyword('IS')) {
      at += 1;
      const negated = isKeyword('NOT');
      if (negated) at += 1;
      const isNull = isKeyword('NULL');
      if (!isNull && !isKeyword('EMPTY'))
        return fail('Was expecting `NULL` or `EMPTY` after `IS`.');
      at += 1;
      return { condition: { kind: isNull ? 'null' : 'empty' }, negated };
    }
    const negated = isKeyword('NOT');
    if (negated) at += 1;
    if (isKeyword('EXISTS')) {
      at += 1;
      return { condition: { kind: 'exists' }, negated };
    }
    if (isKeyword('IN')) {
      at += 1;
      return { condition: { kind: 'in', values: readValueList() }, negated };
    }
    if (isKeyword('STARTS') && isKeyword('WITH', 1)) {
      at += 2;
      return { condition: { kind: 'startsWith', value: readValue('a value') }, negated };
    }
    if (isKeyword('CONTAINS')) return fail('Using `CONTAINS` in a filter is not supported.');
    if (!negated && isKeyword('TO', 1)) {
      const from = readValue('a value');
      at += 1;
      return { condition: { kind: 'between', from, to: readValue('a value') }, negated: false };
    }
    return fail(
      `Was expecting an operation \`=\`, \`!=\`, \`>=\`, \`>\`, \`<=\`, \`<\`, \`IN\`, \`NOT IN\`, \`TO\`, \`EXISTS\`, \`NOT EXISTS\`, \`IS NULL\`, \`IS NOT NULL\`, \`IS EMPTY\`, \`IS NOT EMPTY\`, \`STARTS WITH\` or \`NOT STARTS WITH\` at \`${text}\`.`,
    );
  }

  function readCondition(): FilterNode {
    const start = peek();
    const attribute = readValue('a field name');
    const { condition, negated } = readOperator();
    const node: FilterNode = {
      kind: 'condition',
      attribute,
      span: [start.at, start.end],
      condition,
    };
    return negated ? { kind: 'not', part: node } : node;
  }

  const result = readOr();
  if (peek().kind !== 'end') {
    throw new FilterSyntaxError(
      `Found unexpected characters at the end of the filter: \`${text.slice(peek().at)}\`. You probably forgot an \`OR\` or an \`AND\` rule.`,
      peek().at,
      text.length,
    );
  }
  return result;
}
