import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';

/** WCAG 2.2 A and AA, and what axe counts as good practice. */
const AXE_TAGS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];
const STOPS = 15;

/** Waits until a page shows what it has come to show: no shape of what comes, its letters there. */
export async function settled(page: Page): Promise<void> {
  await page.locator('main h1').first().waitFor();
  await page.waitForFunction(() => document.querySelector('main .shape-coming') === null);
  await page.evaluate(() => document.fonts.ready);
}

/** The rules that another theme can break; all others look at structure and words. */
const COLOUR_RULES = ['color-contrast', 'link-in-text-block'];

/** What axe finds, one line for each rule with the first places. */
export async function axeFindings(page: Page, about: 'all' | 'colours'): Promise<string[]> {
  const axe = new AxeBuilder({ page }).setLegacyMode(true).options({ resultTypes: ['violations'] });
  const asked = about === 'all' ? axe.withTags(AXE_TAGS) : axe.withRules(COLOUR_RULES);
  const { violations } = await asked.analyze();
  return violations.map(({ id, nodes }) => {
    const places = nodes.slice(0, 3).map(({ target, any }) => {
      const why = any[0]?.message ?? '';
      return `${target.join(' ')} ${why}`;
    });
    return `${id}: ${places.join(' | ')}${nodes.length > 3 ? ` and ${nodes.length - 3} more` : ''}`;
  });
}

/** What reaches beyond the right edge, as the first few elements; empty when nothing does. */
export function overflow(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const { scrollWidth } = document.documentElement;
    if (scrollWidth <= window.innerWidth) return [];
    const wide = [...document.querySelectorAll('body *')]
      .filter((element) => element.getBoundingClientRect().right > window.innerWidth + 0.5)
      .slice(-3)
      .map(
        (element) =>
          `${element.tagName.toLowerCase()}.${element.getAttribute('class') ?? ''} “${(element.textContent ?? '').trim().slice(0, 30)}”`,
      );
    return [`${scrollWidth} px wide: ${wide.join(' | ')}`];
  });
}

/** One first heading, a title of its own, a link past the ways at the top. */
export async function outline(page: Page): Promise<string[]> {
  const found: string[] = [];
  const headings = await page.locator('h1:visible').allTextContents();
  if (headings.length !== 1) found.push(`${headings.length} h1: ${headings.join(' | ')}`);
  const title = await page.title();
  if (!title.includes('Spyhole') || title.trim() === 'Spyhole') found.push(`title “${title}”`);
  return found;
}

/** Goes through the first stops by keyboard: each is seen, marked, and none holds the keyboard. */
export async function tabStops(page: Page): Promise<string[]> {
  const found: string[] = [];
  await page.evaluate(() => {
    window.scrollTo(0, 0);
    if (document.activeElement instanceof HTMLElement) document.activeElement.blur();
    // Tabbing starts at the top again, wherever the page has put the focus on arriving.
    document.body.tabIndex = -1;
    document.body.focus();
    document.body.removeAttribute('tabindex');
  });
  await page.keyboard.press('Tab');
  const first = await page.evaluate(() => document.activeElement?.getAttribute('href'));
  if (first !== '#main') found.push(`the first stop is not the link to the page but ${first}`);
  const seen: string[] = [];
  for (let stop = 0; stop < STOPS; stop += 1) {
    const at = await page.evaluate(readFocus);
    // A short page: past its end the keyboard starts at its beginning again.
    if (at === null || at.path === seen[0]) break;
    if (!at.marked) found.push(`no mark of focus on ${at.name}`);
    if (!at.inSight) found.push(`out of sight: ${at.name}`);
    if (seen.includes(at.path)) {
      found.push(`the keyboard comes back to ${at.name}`);
      break;
    }
    seen.push(at.path);
    await page.keyboard.press('Tab');
  }
  return found;
}

/** Runs in the page: what has the focus, whether it shows that, and whether it can be seen. */
function readFocus() {
  const focused = document.activeElement;
  if (!(focused instanceof Element) || focused === document.body) return null;
  const label = focused.closest('label') ?? focused.id;
  const around = [
    focused,
    focused.parentElement,
    focused.nextElementSibling,
    typeof label === 'string'
      ? label === ''
        ? null
        : document.querySelector(`label[for="${CSS.escape(label)}"]`)
      : label,
    focused.closest('.field-corner'),
  ];
  const marked = around.some((element) => {
    if (element === null) return false;
    const { outlineStyle, outlineWidth } = getComputedStyle(element);
    return outlineStyle !== 'none' && parseFloat(outlineWidth) >= 1;
  });
  const box = focused.getBoundingClientRect();
  const inSight = box.bottom > 0 && box.top < innerHeight && box.right > 0 && box.left < innerWidth;
  const path: number[] = [];
  for (let node: Element | null = focused; node?.parentElement; node = node.parentElement) {
    path.push([...node.parentElement.children].indexOf(node));
  }
  const words = focused.getAttribute('aria-label') ?? focused.textContent ?? '';
  return {
    name: `${focused.tagName.toLowerCase()}#${focused.id} “${words.trim().slice(0, 40)}”`,
    path: path.join('.'),
    marked,
    inSight,
  };
}

/** The link past the ways brings the keyboard to the page. */
export async function skipLink(page: Page): Promise<string[]> {
  const link = page.locator('a[href="#main"]');
  await link.focus();
  const box = await link.boundingBox();
  const found = box === null || box.y < 0 ? ['the skip link stays hidden when focused'] : [];
  await page.keyboard.press('Enter');
  const at = await page.evaluate(() => document.activeElement?.id);
  return at === 'main' ? found : [...found, `the skip link leads to ${at}`];
}
