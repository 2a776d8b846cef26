import { expect } from 'vitest';
import type { Locator, Page } from 'playwright-core';

/** The form of a note, as somebody sees it who fills it in. */
export function noteForm(page: Page) {
  const section = (id: string): Locator => page.locator(`#section-${id}`);
  const labelled = (label: string): RegExp => new RegExp(`^${label}( \\(needed\\))?$`);
  return {
    section,
    field: (id: string, label: string): Locator => section(id).getByLabel(labelled(label)),
    /** Crosses one of a row of boxes. */
    cross: async (id: string, label: string, choice: string): Promise<void> => {
      const group = section(id).getByRole('radiogroup', { name: labelled(label) });
      await group.getByLabel(choice, { exact: true }).check();
    },
    tick: async (id: string, label: string, choice: string): Promise<void> => {
      const group = section(id).getByRole('group', { name: labelled(label) });
      await group.getByLabel(choice, { exact: true }).check();
    },
    saved: async (): Promise<void> => {
      await page
        .getByText(/^Saved \d/)
        .first()
        .waitFor();
    },
  };
}

/** Uploads a logger's file, looks at how it was understood, and takes it as the record. */
export async function uploadRecord(page: Page, fileName: string, csv: string): Promise<void> {
  const { section } = noteForm(page);
  const record = section('record').first();
  await record.getByLabel('Upload a file').check();
  await record
    .getByLabel('Record file')
    .setInputFiles({ name: fileName, mimeType: 'text/csv', buffer: Buffer.from(csv, 'utf8') });
  const confirm = record.getByRole('button', { name: 'Yes, use it as the record' });
  await confirm.waitFor();
  expect(await record.getByLabel('Columns parted by').inputValue()).toBe(';');
  expect(await record.getByLabel('Decimal sign').inputValue()).toBe(',');
  await confirm.click();
  await record.getByText(/readings over/).waitFor();
}

interface Marked {
  readonly minute: number;
  readonly what: string;
}

/** Notes when the burner was lit and shut off. */
export async function addMarks(page: Page, marks: readonly Marked[]): Promise<void> {
  const record = noteForm(page).section('record').first();
  for (const { minute, what } of marks) {
    await record.getByLabel('Minute of the new mark').fill(String(minute));
    await record.getByLabel('Kind of the new mark').selectOption({ label: what });
    await record.getByRole('button', { name: 'Add mark' }).click();
  }
}
