/** Addresses of this site in a text, as paths; links to anywhere else stay text. */
export function ownLinksIn(text: string, origin: string): string[] {
  const found = new Set<string>();
  for (const [written] of text.matchAll(/https?:\/\/[^\s<>"]*[^\s<>".,;:!?)]/g)) {
    if (!URL.canParse(written)) continue;
    const url = new URL(written);
    if (url.origin === origin) found.add(`${url.pathname}${url.search}${url.hash}`);
  }
  return [...found];
}
