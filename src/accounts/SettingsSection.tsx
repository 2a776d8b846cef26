import { useId, type ReactNode } from 'react';
import { AccountForm } from './AccountForm.tsx';

interface SectionProps {
  readonly heading: string;
  readonly lead?: ReactNode;
  readonly children: ReactNode;
}

/** A part of the settings under its heavy rule. */
export function SettingsSection({ heading, lead, children }: SectionProps) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="space-y-2 border-t-2 border-soot pt-3">
      <h2 id={id} className="text-section">
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
