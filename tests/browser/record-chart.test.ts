import { expect } from 'vitest';
import type { Page } from 'playwright-core';
import { paths } from '#shared/paths.ts';
import { test } from './browser.ts';
import { axeFindings, overflow, settled } from './page-checks.ts';
import { noteForm, uploadRecord } from './write-a-note.ts';

const COUNT = 50_000;
const WILD_SECOND = 31_415;

/** A reading a second for fourteen hours, with a probe's unrest and one wild second. */
function longRecord(): string {
  const rows = Array.from({ length: COUNT }, (_, second) => {
    const minute = second / 60;
    const climb = 18 + 900 * (1 - Math.exp(-minute / 200));
    const celsius =
      second === WILD_SECOND
        ? 1111
        : climb + 3 * Math.sin(second * 12.9898) + 2 * Math.sin(second * 78.233);
    return `${minute.toFixed(4)};${celsius.toFixed(1)}`.replaceAll('.', ',');
  });
  return ['Minuten;Temperatur °C', ...rows].join('\r\n');
}

/** Times how long it takes from a key on the chart until the frame after it is painted, ms. */
function redraws(page: Page, keys: readonly string[]): Promise<number[]> {
  return page.evaluate(async (pressed) => {
    const slider = document.querySelector<HTMLInputElement>('.chart-surface input');
    if (!slider) throw new Error('There is no chart.');
    slider.focus();
    const painted = (): Promise<void> =>
      new Promise((resolve) => {
        requestAnimationFrame(() => {
          const channel = new MessageChannel();
          channel.port1.onmessage = () => resolve();
          channel.port2.postMessage(null);
        });
      });
    const times: number[] = [];
    for (const key of pressed) {
      await painted();
      const from = performance.now();
      slider.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
      await painted();
      times.push(performance.now() - from);
    }
    return times;
  }, keys);
}

/** How many readings the chart has drawn. */
const drawnReadings = (page: Page): Promise<number> =>
  page
    .locator('#section-record .readings')
    .evaluate((path) => (path.getAttribute('d') ?? '').split(/[ML]/).length - 1);

test('fifty thousand readings are looked at closely, read off, and drawn at once', async ({
  visiting,
}) => {
  const { page } = await visiting.visit({ as: visiting.account('member') });
  await page.goto(paths.newNote());
  await page.getByRole('button', { name: 'Start without a kiln, and choose it later' }).click();
  const section = noteForm(page).section('record').first();
  await section.waitFor();
  await uploadRecord(page, 'night.csv', longRecord());
  const slider = section.getByRole('slider', { name: 'Read along the curve' });
  await slider.waitFor();

  // From afar: no more than the screen can show, and the wild second is not lost.
  expect(await drawnReadings(page)).toBeLessThan(4 * 1280);
  await section.getByText('The readings as a table').click();
  const highest = section.getByRole('row', { name: /highest/ });
  // In whichever unit the member reads.
  await highest.getByText(/^(1111\s°C|2032\s°F)$/).waitFor();
  await section.getByRole('link', { name: `All ${COUNT} readings as CSV` }).waitFor();
  await section.getByText('The readings as a table').click();

  // Closely, by its buttons: the readings between come from the server.
  const part = page.waitForResponse((answer) => answer.url().includes('&from='));
  const closer = section.getByRole('button', { name: 'Look closer' });
  for (let press = 0; press < 6; press += 1) await closer.click();
  expect((await part).status()).toBe(200);
  const shown = section.getByRole('group', { name: 'What the chart shows' });
  await shown.getByText(/^410\.\d to 423\.\d\smin of 0 to 833\smin$/).waitFor();
  await expect.poll(() => drawnReadings(page), { timeout: 20_000 }).toBeGreaterThan(600);

  // By keyboard: to the end and back to all of it.
  await slider.focus();
  await page.keyboard.press('End');
  await shown.getByText(/^820\.\d to 833\.\d\smin/).waitFor();
  expect(await slider.getAttribute('aria-valuetext')).toMatch(/^833\.3\d?\smin, \d{3,4}\s°[CF]$/);
  await page.keyboard.press('0');
  await shown.getByText('all of it, 0 to 833\u00a0min').waitFor();

  // By dragging, which every button above stands in for.
  const box = await section.locator('.chart-surface').boundingBox();
  if (!box) throw new Error('The chart cannot be seen.');
  await page.mouse.move(box.x + box.width * 0.25, box.y + box.height / 2);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width * 0.5, box.y + box.height / 2, { steps: 5 });
  await page.mouse.up();
  await shown.getByText(/^20[789] to 41[5678]\smin/).waitFor();
  await shown.getByRole('button', { name: 'Whole' }).click();

  const times = await redraws(page, ['+', '+', '+', '+', '-', '-', '-', '-', '+', '+', '+', '0']);
  times.sort((one, other) => one - other);
  // Some 25 ms where nothing else runs; the machine of the tests may be busy.
  expect(times[Math.floor(times.length / 2)]).toBeLessThan(250);
});

test('a chart with another firing laid over it is sound in both themes and at 320 px', async ({
  visiting,
}) => {
  for (const theme of ['light', 'dark'] as const) {
    const { page } = await visiting.visit({ theme });
    await page.goto(paths.newest);
    await page.getByRole('main').getByRole('heading', { level: 1 }).waitFor();
    const addresses = await page
      .locator('main a[href^="/notes/"]')
      .evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
    const menu = page.getByLabel('Lay over it');
    for (const address of new Set(addresses)) {
      await page.goto(address);
      await settled(page);
      if ((await menu.count()) > 0) break;
    }
    const [, first] = await menu.locator('option').all();
    await menu.selectOption((await first?.getAttribute('value')) ?? '');
    await page
      .getByText(/^(earlier|next) firing, “/)
      .first()
      .waitFor();
    await page.getByText('The readings as a table').click();
    await page.getByRole('button', { name: 'Look closer' }).click();
    const slider = page.getByRole('slider', { name: 'Read along the curve' });
    await slider.focus();
    await page.keyboard.press('PageUp');
    expect(await axeFindings(page, 'all'), theme).toEqual([]);
    for (const width of [390, 320]) {
      await page.setViewportSize({ width, height: 700 });
      expect(await overflow(page), `${theme} ${width}`).toEqual([]);
      expect(await axeFindings(page, 'all'), `${theme} ${width}`).toEqual([]);
    }
  }
});
