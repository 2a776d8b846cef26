/** A word, a number or a mark of the typed text, with its place in it. */
export interface Token {
  readonly kind: 'word' | 'number' | 'mark';
  /** Lower case, without accents and apostrophes ("won't" is "wont"). */
  readonly text: string;
  readonly from: number;
  readonly to: number;
  /** True when nothing stands between this token and the one before. */
  readonly glued: boolean;
}

/** Text beyond this is not read: a question is a sentence, not a page. */
export const MAX_READ_CHARACTERS = 600;

/**
 * In this order: degree signs (one of them counts as a letter), words with inner apostrophes,
 * thousands with a comma, numbers, fractions, and single marks. No part can match the same text in
 * two ways, so the time is linear in the text.
 */
const TOKEN =
  /(?<mark>[°º˚])|(?<word>\p{L}+(?:['’]\p{L}+)*)|(?<number>\d,\d{3}(?!\d)|\d+(?:\.\d+)?|[½¼¾])|(?<other>[^\s\p{L}\p{N}])/gu;

const SAME_MARK: Readonly<Record<string, string>> = {
  º: '°',
  '˚': '°',
  '–': '-',
  '—': '-',
  '−': '-',
  '‐': '-',
  '‑': '-',
  '”': '"',
  '“': '"',
  '″': '"',
  '’': "'",
  '‘': "'",
  '′': "'",
  '≈': '~',
  '∆': '^',
  Δ: '^',
  '△': '^',
  '×': 'x',
  '…': '.',
  '；': ';',
};

function plain(text: string): string {
  return text
    .normalize('NFKD')
    .replace(/[\p{M}'’]/gu, '')
    .toLowerCase();
}

/** Splits a question into words, numbers and marks. Never throws; linear in the text. */
export function tokenise(text: string): Token[] {
  const tokens: Token[] = [];
  let end = 0;
  for (const match of text.slice(0, MAX_READ_CHARACTERS).matchAll(TOKEN)) {
    const raw = match[0];
    const from = match.index;
    const to = from + raw.length;
    const groups = match.groups ?? {};
    const place = { from, to, glued: tokens.length > 0 && from === end };
    if (groups['word'] !== undefined && SAME_MARK[raw] === undefined) {
      tokens.push({ kind: 'word', text: plain(raw), ...place });
    } else if (groups['number'] !== undefined) {
      tokens.push({ kind: 'number', text: raw, ...place });
    } else {
      tokens.push({ kind: 'mark', text: SAME_MARK[raw] ?? raw, ...place });
    }
    end = to;
  }
  return tokens.filter((token) => token.text !== '');
}
