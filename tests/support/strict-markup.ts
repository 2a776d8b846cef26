import { JSDOM } from 'jsdom';

/** What a story may hold, said a second time and independently of the sanitiser. */
const ALLOWED: Readonly<Record<string, readonly string[]>> = {
  P: ['class'],
  H3: [],
  H4: [],
  UL: [],
  OL: ['start'],
  LI: [],
  BLOCKQUOTE: [],
  HR: [],
  BR: [],
  STRONG: [],
  EM: [],
  A: ['href', 'rel'],
  ASIDE: ['class', 'role'],
  FIGURE: [],
  FIGCAPTION: [],
  IMG: ['src', 'srcset', 'sizes', 'alt', 'width', 'height', 'loading'],
};
const XHTML = 'http://www.w3.org/1999/xhtml';
const PICTURE = String.raw`/media/pictures/[0-9a-f]{32}/\d{1,5}\.webp`;
const VALUES: Readonly<Record<string, RegExp>> = {
  role: /^note$/,
  class: /^(aside-label|caution|change)$/,
  start: /^\d{1,5}$/,
  width: /^\d{1,5}$/,
  height: /^\d{1,5}$/,
  rel: /^noopener nofollow ugc$/,
  loading: /^lazy$/,
  sizes: /^\(min-width: \d+rem\) \d+rem, 100vw$/,
  src: new RegExp(`^${PICTURE}$`),
  srcset: new RegExp(`^${PICTURE} \\d+w(, ${PICTURE} \\d+w)*$`),
};

const parser = new new JSDOM('').window.DOMParser();

function linkFindings(href: string): string[] {
  let url: URL;
  try {
    url = new URL(href);
  } catch {
    return [`a link that is no absolute address: ${href}`];
  }
  const wrong = [];
  if (!['http:', 'https:', 'mailto:'].includes(url.protocol)) wrong.push(url.protocol);
  if (url.username || url.password) wrong.push('credentials');
  // eslint-disable-next-line no-control-regex -- those are what is looked for
  if (/[\s\\\u0000-\u001f\u007f-\u009f\u200b-\u200f\u202a-\u202e\u2066-\u2069]/.test(href)) {
    wrong.push('a character that hides something');
  }
  return wrong.map((what) => `a link with ${what}: ${href}`);
}

/**
 * Everything in a piece of HTML that is not on the closed list, as a parser sees it: stricter than
 * any browser, which would ignore most of it.
 */
export function findingsIn(html: string): string[] {
  const document = parser.parseFromString(`<!doctype html><body><main>${html}</main>`, 'text/html');
  const main = document.querySelector('main');
  if (!main || document.body.children.length !== 1) return ['it breaks out of its place'];
  if (document.head.children.length > 0) return ['it puts something into the head'];
  const findings: string[] = [];
  const walker = document.createTreeWalker(main, 0xffffffff);
  for (let node = walker.nextNode(); node; node = walker.nextNode()) {
    if (node.nodeType === 3) continue;
    if (node.nodeType !== 1) {
      findings.push(`a node of type ${String(node.nodeType)}`);
      continue;
    }
    const element = node as Element;
    const allowed = Object.hasOwn(ALLOWED, element.tagName) ? ALLOWED[element.tagName] : undefined;
    if (!allowed || element.namespaceURI !== XHTML) {
      findings.push(`the element ${element.tagName}`);
      continue;
    }
    for (const { name, value } of element.attributes) {
      if (!allowed.includes(name)) findings.push(`${element.tagName} with ${name}="${value}"`);
      else if (name === 'href') findings.push(...linkFindings(value));
      else if (VALUES[name]?.test(value) === false) findings.push(`${name}="${value}"`);
    }
    if (element.tagName === 'A' && element.hasAttribute('href') && !element.hasAttribute('rel')) {
      findings.push('a link without rel');
    }
    if (element.tagName === 'IMG' && !element.hasAttribute('src')) findings.push('an empty img');
  }
  return findings;
}
