import type { TextMatch } from './text-matcher.ts';
import type { Token } from './tokenise.ts';

/** The part of a text to show, in UTF-16 units. */
export type CropWindow = { start: number; end: number };

/**
 * The stretch of `cropLength` words that shows most of the query: most different query words first,
 * then most matches, then the earliest. The matches stand in its middle. Null when the text fits.
 */
export function cropWindow(
  text: string,
  tokens: readonly Token[],
  matches: readonly TextMatch[],
  cropLength: number,
): CropWindow | null {
  if (cropLength === 0 || tokens.length <= cropLength) return null;
  const first = firstTokenOfBest(tokens, matches, cropLength);
  const last = Math.min(first + cropLength, tokens.length) - 1;
  return {
    start: first === 0 ? 0 : (tokens[first]?.start ?? 0),
    end: last === tokens.length - 1 ? text.length : (tokens[last]?.end ?? text.length),
  };
}

function firstTokenOfBest(
  tokens: readonly Token[],
  matches: readonly TextMatch[],
  cropLength: number,
): number {
  let best = { units: 0, count: 0, from: 0, to: 0 };
  for (const [at, match] of matches.entries()) {
    const units = new Set<number>();
    let count = 0;
    let to = match.firstToken;
    for (const other of matches.slice(at)) {
      if (other.firstToken >= match.firstToken + cropLength) break;
      units.add(other.unit);
      count += 1;
      to = other.firstToken;
    }
    if (units.size > best.units || (units.size === best.units && count > best.count)) {
      best = { units: units.size, count, from: match.firstToken, to };
    }
  }
  if (best.units === 0) return 0;
  const spare = cropLength - (best.to - best.from + 1);
  const wanted = best.from - Math.floor(spare / 2);
  return Math.max(0, Math.min(wanted, tokens.length - cropLength));
}
