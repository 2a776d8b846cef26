import path from 'node:path';
import { chromium } from 'playwright-core';
import { startProduct } from '../support/product.ts';

/**
 * `npm run screenshots`: starts the product with its demo and takes the README's pictures. With a
 * folder as argument it takes every public page there, in both themes and both widths, to be looked
 * at.
 */
const [folder] = process.argv.slice(2);
const product = await startProduct();
const browser = await chromium.launch({
  executablePath: '/usr/bin/chromium',
  args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking'],
});

async function shoot(
  name: string,
  url: string,
  theme: 'day' | 'dusk',
  width: number,
  into: string,
  fullPage: boolean,
) {
  const context = await browser.newContext({
    baseURL: product.baseUrl,
    viewport: { width, height: width < 600 ? 844 : 900 },
    colorScheme: theme === 'day' ? 'light' : 'dark',
    reducedMotion: 'reduce',
  });
  const page = await context.newPage();
  await page.goto(url, { waitUntil: 'networkidle' });
  await page.screenshot({
    path: path.join(into, `${name}-${theme}-${String(width)}.png`),
    fullPage,
  });
  await context.close();
}

try {
  const answer = await fetch(
    `${product.baseUrl}/api/search?q=${encodeURIComponent('stalled at 700 °C')}`,
  );
  const { hits } = (await answer.json()) as {
    hits: { note: { id: number; kiln: { id: number } } }[];
  };
  const [first] = hits;
  if (!first) throw new Error('The demo has no note that stalled near 700 °C.');
  const pages: [string, string][] = [
    ['front', '/'],
    ['find', `/find?q=${encodeURIComponent('stalled at 700 °C')}`],
    ['note', `/notes/${String(first.note.id)}`],
    ['kiln', `/kilns/${String(first.note.kiln.id)}`],
    ['what-helped', '/what-helped/stall'],
    ['cautions', '/cautions'],
    ['sign-in', '/sign-in'],
    ['nothing', '/nowhere'],
  ];
  if (folder === undefined) {
    const here = import.meta.dirname;
    await shoot('note', pages[2]?.[1] ?? '/', 'day', 1280, here, false);
    await shoot('find', pages[1]?.[1] ?? '/', 'dusk', 1280, here, false);
  } else {
    for (const [name, url] of pages) {
      for (const theme of ['day', 'dusk'] as const) {
        for (const width of [390, 1280]) await shoot(name, url, theme, width, folder, true);
      }
    }
  }
} finally {
  await browser.close();
  await product.stop();
}
