import { useId, type ReactNode } from 'react';
import { AccountForm } from './AccountForm.tsx';

interface SectionProps {
  /** Its fragment in the address of the page. */
  readonly id: string;
  readonly heading: string;
  readonly lead?: ReactNode;
  readonly children: ReactNode;
}

/** A part of the settings under its heavy rule. */
export function SettingsSection({ id, heading, lead, children }: SectionProps) {
  const headingId = useId();
  return (
    <section id={id} aria-labelledby={headingId} className="space-y-2 border-t-2 border-soot pt-3">
      <h2 id={headingId} className="text-section">
        {heading}
      </h2>
      {lead && <p className="max-w-measure text-small text-soot-2">{lead}</p>}
      {children}
    </section>
  );
}

interface FormProps extends SectionProps {
  readonly onSubmit: () => void;
  readonly error: unknown;
  readonly fields: readonly string[];
}

/** A part of the settings that is saved by itself. */
export function SettingsForm({ onSubmit, error, fields, ...section }: FormProps) {
  return (
    <SettingsSection {...section}>
      <AccountForm onSubmit={onSubmit} error={error} fields={fields}>
        {section.children}
      </AccountForm>
    </SettingsSection>
  );
}
