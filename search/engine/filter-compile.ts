import { EngineError } from './errors.ts';
import { parseFilterExpression, type FilterNode } from './filter-parser.ts';
import { FilterSyntaxError, positionedMessage } from './filter-syntax-error.ts';
import { describeJson, type Json } from './json.ts';

export type FilterTarget = {
  /** Code of the error thrown: `invalid_search_filter` or `invalid_document_filter`. */
  code: string;
  /** Index named in messages. */
  indexUid: string;
  filterable: readonly string[];
  isFilterable: (attribute: string) => boolean;
  allowsComparison: (attribute: string) => boolean;
};

const MAX_PARTS = 10_000;

/**
 * Reads a filter as sent: a string, or a list joined by AND whose inner lists are joined by OR
 * (two levels at most). Answers null when there is nothing to filter by.
 */
export function compileFilter(filter: Json | undefined, target: FilterTarget): FilterNode | null {
  if (filter === undefined || filter === null) return null;
  if (typeof filter === 'string') return compileExpression(filter, target);
  if (!Array.isArray(filter)) throw wrongShape(filter, target);
  let count = 0;
  const parts: FilterNode[] = [];
  for (const outer of filter) {
    if (Array.isArray(outer)) {
      const inner: FilterNode[] = [];
      for (const item of outer) {
        if (typeof item !== 'string') throw wrongShape(item, target);
        const node = compileExpression(item, target);
        if (node !== null) inner.push(node);
      }
      count += inner.length;
      if (inner.length > 0) parts.push({ kind: 'or', parts: inner });
    } else if (typeof outer === 'string') {
      const node = compileExpression(outer, target);
      if (node !== null) parts.push(node);
      count += 1;
    } else {
      throw wrongShape(outer, target);
    }
    if (count > MAX_PARTS) throw new EngineError(target.code, 'Too many filter conditions.');
  }
  return parts.length === 0 ? null : { kind: 'and', parts };
}

function wrongShape(found: Json, target: FilterTarget): EngineError {
  return new EngineError(
    target.code,
    `Invalid syntax for the filter parameter: \`expected String, Array, found: ${describeJson(found)}\`.`,
  );
}

function compileExpression(expression: string, target: FilterTarget): FilterNode | null {
  if (expression.trim() === '') return null;
  try {
    const node = parseFilterExpression(expression);
    checkAttributes(node, target);
    return node;
  } catch (error) {
    if (error instanceof FilterSyntaxError) {
      throw new EngineError(target.code, positionedMessage(error, expression));
    }
    throw error;
  }
}

function checkAttributes(node: FilterNode, target: FilterTarget): void {
  if (node.kind === 'not') return checkAttributes(node.part, target);
  if (node.kind !== 'condition') {
    for (const part of node.parts) checkAttributes(part, target);
    return;
  }
  const { attribute, span, condition } = node;
  if (!target.isFilterable(attribute)) {
    const known =
      target.filterable.length === 0
        ? 'This index does not have configured filterable attributes.'
        : `Available filterable attribute patterns are: \`${target.filterable.join(', ')}\`.`;
    throw new FilterSyntaxError(
      `Index \`${target.indexUid}\`: Attribute \`${attribute}\` is not filterable. ${known}`,
      span[0],
      span[1],
    );
  }
  const compares =
    condition.kind === 'between' ||
    (condition.kind === 'compare' && condition.operator !== '=' && condition.operator !== '!=');
  if (compares && !target.allowsComparison(attribute)) {
    throw new FilterSyntaxError(
      `Index \`${target.indexUid}\`: Filter operator is not allowed for the attribute \`${attribute}\`: comparison is switched off for it.`,
      span[0],
      span[1],
    );
  }
}
