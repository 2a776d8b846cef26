import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { SelectField } from '../ui/SelectField.tsx';
import { dayWords } from './note-words.ts';
import { kindOf, type Compared } from './useComparedRecord.ts';

const WORDS = { earlier: 'Earlier', next: 'Next', alike: 'Climbed like it' } as const;

/** Which other firing is drawn over this one, and from where both are counted. */
export function CompareMenu({ compared }: { readonly compared: Compared }) {
  const { choices, choice, choose, alignment, align, litKnown, error } = compared;
  if (choices.length === 0) return null;
  return (
    <div className="@container not-in-print border-t border-line">
      <SelectField
        label="Lay over it"
        value={choice}
        onValue={choose}
        blank="no other firing"
        options={choices.map(({ value, other }) => ({
          value,
          label: `${WORDS[kindOf(value)]}: ${other.title || 'Untitled'}, ${dayWords(other.firedOn)}`,
        }))}
      />
      {choice !== null && litKnown && (
        <SelectField
          label="Both counted from"
          value={alignment}
          onValue={(value) => align(value ?? 'lit')}
          blank={null}
          options={[
            { value: 'lit', label: 'where they were lit' },
            { value: 'climb', label: 'where the climb begins' },
          ]}
        />
      )}
      <p role="status" className="text-note text-soot-2 empty:hidden">
        {compared.isPending ? 'The other record is being fetched…' : ''}
        {compared.overlay && !litKnown
          ? 'Both are counted from where the climb begins; the lighting was not marked in both.'
          : ''}
      </p>
      {error && (
        <Notice kind="error" action={<Button onClick={compared.retry}>Try again</Button>}>
          The other record could not be fetched.
        </Notice>
      )}
    </div>
  );
}
