import { escapeHtml } from '../story/story-markup.ts';

/** What a page says about itself to browsers, search engines and link previews. */
export interface PageHead {
  readonly title: string;
  readonly description: string;
  /** Path of the page's one true address; null for pages nobody should find or share. */
  readonly canonical: string | null;
  /** Path of a JPEG. */
  readonly image: string | null;
  readonly type: 'website' | 'article';
  readonly jsonLd: object | null;
}

/** JSON that may stand inside a script element: nothing in it can end the element. */
export function jsonForScript(value: object): string {
  return JSON.stringify(value)
    .replace(/</g, '\\u003c')
    .replace(/>/g, '\\u003e')
    .replace(/&/g, '\\u0026')
    .replace(/\u2028/g, '\\u2028')
    .replace(/\u2029/g, '\\u2029');
}

/** The elements for the document's head. Every value is text: escaped here and nowhere else. */
export function headMarkup(head: PageHead, publicUrl: string): string {
  const meta = (attribute: 'name' | 'property', name: string, content: string): string =>
    `<meta ${attribute}="${name}" content="${escapeHtml(content)}">`;
  const lines = [
    `<title>${escapeHtml(head.title)}</title>`,
    meta('name', 'description', head.description),
    meta('property', 'og:site_name', 'Spyhole'),
    meta('property', 'og:type', head.type),
    meta('property', 'og:title', head.title),
    meta('property', 'og:description', head.description),
  ];
  if (head.canonical === null) {
    lines.push(meta('name', 'robots', 'noindex'));
  } else {
    const url = `${publicUrl}${head.canonical}`;
    lines.push(`<link rel="canonical" href="${escapeHtml(url)}">`, meta('property', 'og:url', url));
  }
  if (head.image !== null) lines.push(meta('property', 'og:image', `${publicUrl}${head.image}`));
  if (head.jsonLd !== null) {
    lines.push(`<script type="application/ld+json">${jsonForScript(head.jsonLd)}</script>`);
  }
  return lines.join('\n    ');
}
