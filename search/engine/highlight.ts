import { cropWindow } from './crop.ts';
import type { TextMatch, TextMatcher } from './text-matcher.ts';

export type FormatOptions = {
  highlight: { preTag: string; postTag: string } | null;
  crop: { length: number; marker: string } | null;
};

/** A text with its matches between tags, cut to the words around them if asked for. */
export function formatText(text: string, matcher: TextMatcher, options: FormatOptions): string {
  const { highlight, crop } = options;
  if (highlight === null && crop === null) return text;
  const tokens = matcher.tokenise(text);
  const matches = matcher.matchesIn(text, tokens);
  const cropped = crop === null ? null : cropWindow(text, tokens, matches, crop.length);
  const window = cropped ?? { start: 0, end: text.length };
  const body =
    highlight === null
      ? text.slice(window.start, window.end)
      : tagged(text, matches, window, highlight);
  if (crop === null || cropped === null) return body;
  const before = window.start > 0 ? crop.marker : '';
  const after = window.end < text.length ? crop.marker : '';
  return before + body + after;
}

function tagged(
  text: string,
  matches: readonly TextMatch[],
  window: { start: number; end: number },
  tags: { preTag: string; postTag: string },
): string {
  let result = '';
  let at = window.start;
  for (const match of matches) {
    if (match.start < at || match.start >= window.end) continue;
    const end = Math.min(match.end, window.end);
    result += text.slice(at, match.start) + tags.preTag + text.slice(match.start, end);
    result += tags.postTag;
    at = end;
  }
  return result + text.slice(at, window.end);
}
