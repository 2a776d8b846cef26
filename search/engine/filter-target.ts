import { matchesPattern } from './flatten.ts';
import type { FilterTarget } from './filter-compile.ts';
import type { FilterableAttribute, Settings } from './settings.ts';

function ruleFor(attribute: string, settings: Settings): FilterableAttribute | undefined {
  return settings.filterableAttributes.find((entry) =>
    (typeof entry === 'string' ? [entry] : entry.attributePatterns).some((pattern) =>
      matchesPattern(attribute, pattern),
    ),
  );
}

export function isFilterable(attribute: string, settings: Settings): boolean {
  const rule = ruleFor(attribute, settings);
  return rule !== undefined && (typeof rule === 'string' || rule.features.filter.equality);
}

export function allowsFacetSearch(attribute: string, settings: Settings): boolean {
  const rule = ruleFor(attribute, settings);
  return rule !== undefined && (typeof rule === 'string' || rule.features.facetSearch);
}

export function filterablePatterns(settings: Settings): string[] {
  return settings.filterableAttributes.flatMap((entry) =>
    typeof entry === 'string' ? [entry] : entry.attributePatterns,
  );
}

/** What a filter on this index may name, and how its errors are called. */
export function filterTarget(settings: Settings, indexUid: string, code: string): FilterTarget {
  return {
    code,
    indexUid,
    filterable: filterablePatterns(settings),
    isFilterable: (attribute) => isFilterable(attribute, settings),
    allowsComparison: (attribute) => {
      const rule = ruleFor(attribute, settings);
      return typeof rule === 'string' || rule?.features.filter.comparison === true;
    },
  };
}
