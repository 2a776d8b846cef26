import { CAUTIONS } from '#shared/cautions.ts';
import { CheckField } from '../ui/CheckField.tsx';
import { Disclosure } from '../ui/Disclosure.tsx';
import { CautionNote } from '../ui/CautionNote.tsx';
import { useWriteForm } from './form-context.ts';
import { PinnedField } from './PinnedField.tsx';

/** The cautions, to be read by whoever hands in: others will fire by the note. */
export function CautionsToRead() {
  const { fields, change, issuesAt, marginAt } = useWriteForm();
  return (
    <div className="space-y-2">
      <CautionNote heading="The cautions, before others fire by your note">
        {CAUTIONS.map(({ title, lines }) => (
          <Disclosure key={title} summary={title} open={!fields.cautionsRead}>
            <ul className="space-y-1">
              {lines.map(({ text }) => (
                <li key={text}>{text}</li>
              ))}
            </ul>
          </Disclosure>
        ))}
      </CautionNote>
      <PinnedField pointer="/cautionsRead">
        <CheckField
          label="I have read the cautions, and my note leads nobody past them"
          required
          checked={fields.cautionsRead}
          onChecked={(cautionsRead) => change((now) => ({ ...now, cautionsRead }))}
          issues={issuesAt('/cautionsRead')}
          margin={marginAt('/cautionsRead')}
        />
      </PinnedField>
    </div>
  );
}
