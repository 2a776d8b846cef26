import { parentPort } from 'node:worker_threads';
import createDOMPurify from 'dompurify';
import { JSDOM } from 'jsdom';

/**
 * The closed list of what a story may hold. Runs on a thread of its own: nested markup can keep a
 * parser busy for seconds, and the page server must not wait for it.
 */
/** @type {Record<string, string[]>} */
const ELEMENTS = {
  p: ['class'],
  h3: [],
  h4: [],
  ul: [],
  ol: ['start'],
  li: [],
  blockquote: [],
  hr: [],
  br: [],
  strong: [],
  em: [],
  a: ['href', 'rel'],
  // A note, because an aside of its own would be a landmark within the page's main one.
  aside: ['class', 'role'],
  figure: [],
  figcaption: [],
  img: ['src', 'srcset', 'sizes', 'alt', 'width', 'height', 'loading'],
};
/** @type {Record<string, string[]>} */
const CLASSES = { p: ['aside-label'], aside: ['caution', 'change'] };
const OWN_PICTURE = /^\/media\/pictures\/[0-9a-f]{32}\/\d{1,5}\.webp$/;
const OWN_PICTURES =
  /^\/media\/pictures\/[0-9a-f]{32}\/\d{1,5}\.webp \d{1,5}w(, \/media\/pictures\/[0-9a-f]{32}\/\d{1,5}\.webp \d{1,5}w)*$/;
const SIZES = /^\(min-width: \d+rem\) \d+rem, 100vw$/;
const LINK = /^(https?:\/\/[^\s\\/?#@\p{Cc}\p{Cf}]+([/?#]|$)|mailto:)[^\s\\\p{Cc}\p{Cf}]*$/iu;
const NUMBER = /^\d{1,5}$/;

/** @type {Record<string, RegExp>} */
const ALLOWED_VALUES = {
  src: OWN_PICTURE,
  srcset: OWN_PICTURES,
  sizes: SIZES,
  href: LINK,
  rel: /^noopener nofollow ugc$/,
  start: NUMBER,
  width: NUMBER,
  height: NUMBER,
  loading: /^lazy$/,
  role: /^note$/,
};

const { window } = new JSDOM('');
const purify = createDOMPurify(window);
purify.addHook('uponSanitizeAttribute', (node, data) => {
  const element = node.nodeName.toLowerCase();
  const allowed = ELEMENTS[element] ?? [];
  const value = data.attrValue;
  const pattern = ALLOWED_VALUES[data.attrName];
  const right =
    allowed.includes(data.attrName) &&
    (pattern === undefined || pattern.test(value)) &&
    (data.attrName !== 'class' || (CLASSES[element] ?? []).includes(value));
  if (!right) data.keepAttr = false;
});
purify.addHook('uponSanitizeElement', (node) => {
  // An element made with `is` is written out with it even when the attribute has been removed.
  if (node.nodeType === 1 && /** @type {Element} */ (node).hasAttribute('is')) {
    /** @type {Element} */ (node).remove();
  }
});
purify.addHook('afterSanitizeAttributes', (node) => {
  if (node.nodeName === 'A' && node.hasAttribute('href')) {
    node.setAttribute('rel', 'noopener nofollow ugc');
  }
  // A picture from anywhere else has lost its source: it goes.
  if (node.nodeName === 'IMG' && !node.hasAttribute('src')) node.remove();
});

/** @param {string} html */
export function sanitise(html) {
  return purify.sanitize(html, {
    ALLOWED_TAGS: Object.keys(ELEMENTS),
    ALLOWED_ATTR: [...new Set(Object.values(ELEMENTS).flat())],
    ALLOW_DATA_ATTR: false,
    ALLOW_ARIA_ATTR: false,
    ALLOW_UNKNOWN_PROTOCOLS: false,
    KEEP_CONTENT: true,
  });
}

parentPort?.on('message', (html) => {
  try {
    parentPort?.postMessage(sanitise(html));
  } catch {
    parentPort?.postMessage(null);
  }
});
