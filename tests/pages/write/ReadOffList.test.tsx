import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useMemo, useState } from 'react';
import { describe, expect, it } from 'vitest';
import type { Finding } from '#shared/firing/findings.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { MessagesProvider } from '../../../src/ui/MessagesProvider.tsx';
import { WriteFormContext, type WriteForm } from '../../../src/write/form-context.ts';
import { ReadOffList } from '../../../src/write/ReadOffList.tsx';

const stall = (fromMinute: number, levelCelsius: number): Finding => ({
  code: 'stall',
  trouble: 'stall',
  fromMinute,
  toMinute: fromMinute + 8,
  numbers: { levelCelsius, minutes: 8 },
  then: 'climbed',
});
const FINDINGS = [stall(20, 640), stall(40, 720)];

let kept: NoteFields;
function Form({ editable = true }: { readonly editable?: boolean }) {
  const [fields, setFields] = useState(emptyNoteFields());
  kept = fields;
  const form = useMemo(
    () =>
      ({
        fields,
        editable,
        units: METRIC_UNITS,
        reading: { reading: null, findings: FINDINGS, checks: [], proposedChanges: [] },
        change: (update) => setFields(update),
        issuesAt: () => [],
      }) satisfies Partial<WriteForm> as unknown as WriteForm,
    [fields, editable],
  );
  return (
    <MessagesProvider>
      <WriteFormContext value={form}>
        <ReadOffList />
      </WriteFormContext>
    </MessagesProvider>
  );
}
const itemOf = (words: RegExp) => {
  const item = screen.getByText(words).closest('li');
  if (!item) throw new Error('The finding stands in no list.');
  return within(item);
};

describe('disagreeing with what is read off the record', () => {
  it('keeps what is typed in the draft, about the very finding', async () => {
    render(<Form />);
    await userEvent.click(itemOf(/Levelled off at 720/).getByRole('button'));
    expect(kept.findingDisputes).toEqual([{ code: 'stall', minute: 40, sentence: '' }]);
    await userEvent.type(screen.getByRole('textbox'), 'The probe slipped.');
    expect(kept.findingDisputes).toEqual([
      { code: 'stall', minute: 40, sentence: 'The probe slipped.' },
    ]);
    expect(itemOf(/Levelled off at 640/).getByRole('button')).toHaveTextContent('I disagree');
  });

  it('is taken back with one press, which can be undone', async () => {
    render(<Form />);
    await userEvent.click(itemOf(/Levelled off at 640/).getByRole('button'));
    await userEvent.type(screen.getByRole('textbox'), 'We waited on purpose.');
    await userEvent.click(itemOf(/Levelled off at 640/).getByRole('button'));
    expect(kept.findingDisputes).toEqual([]);
    await userEvent.click(await screen.findByText('Undo'));
    expect(kept.findingDisputes).toEqual([
      { code: 'stall', minute: 20, sentence: 'We waited on purpose.' },
    ]);
  });

  it('is not offered where the note cannot be edited', () => {
    render(<Form editable={false} />);
    expect(screen.queryByRole('button')).toBeNull();
  });
});
