import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { Me } from '#shared/api/accounts.ts';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { CheckField } from '../ui/CheckField.tsx';
import { SelectField } from '../ui/SelectField.tsx';
import { rememberThemeChoice } from '../ui/theme.ts';
import { useMessages } from '../ui/useMessages.ts';
import { changeSettings } from './account-mutations.ts';
import { FormFoot } from './FormFoot.tsx';
import { rememberMe } from './session-cache.ts';
import { SettingsForm } from './SettingsSection.tsx';

/** Units, theme, keys and mails: one save for all, so that two of them never overwrite each other. */
export function ReadingSettings({ me }: { readonly me: Me }) {
  const client = useQueryClient();
  const tell = useMessages();
  const [settings, setSettings] = useState(me.settings);
  const { mails } = settings;
  const setMails = (changed: Partial<typeof mails>): void =>
    setSettings((before) => ({ ...before, mails: { ...before.mails, ...changed } }));
  const saving = useMutation({
    mutationFn: changeSettings,
    networkMode: 'always',
    onSuccess: (saved) => {
      rememberThemeChoice(saved.settings.theme);
      rememberMe(client, saved);
      tell({ kind: 'done', text: 'Your settings are saved.' });
    },
  });
  return (
    <SettingsForm
      id="reading"
      heading="How you read and what is mailed"
      lead="Kept with your account, so it is the same on every device."
      error={saving.error}
      fields={[]}
      onSubmit={() => {
        if (!saving.isPending) saving.mutate(settings);
      }}
    >
      <SelectField
        label="Temperatures"
        blank={null}
        options={[
          { value: 'C', label: '°C' },
          { value: 'F', label: '°F' },
        ]}
        value={settings.temperature}
        onValue={(temperature) => temperature && setSettings({ ...settings, temperature })}
      />
      <SelectField
        label="Other measures"
        blank={null}
        hint="Lengths, weights, volumes and pressures."
        options={[
          { value: 'metric', label: 'Metric' },
          { value: 'imperial', label: 'Imperial' },
        ]}
        value={settings.system}
        onValue={(system) => system && setSettings({ ...settings, system })}
      />
      <SelectField
        label="Theme"
        blank={null}
        options={[
          { value: 'system', label: 'As the device' },
          { value: 'day', label: 'Day' },
          { value: 'dusk', label: 'Dusk' },
        ]}
        value={settings.theme}
        onValue={(theme) => theme && setSettings({ ...settings, theme })}
      />
      <Aside label="Keys">
        <CheckField
          label="Single keys do things on the desk and on notes"
          hint="Never while you type. Switch them off if you speak to your computer or press keys by mistake."
          checked={settings.singleKeys}
          onChecked={(singleKeys) => setSettings({ ...settings, singleKeys })}
        />
      </Aside>
      <Aside label="Mail me when">
        <CheckField
          label="a moderator has decided about a note of mine"
          checked={mails.decisions}
          onChecked={(decisions) => setMails({ decisions })}
        />
        <CheckField
          label="somebody tried a change from a note of mine"
          checked={mails.triedIt}
          onChecked={(triedIt) => setMails({ triedIt })}
        />
        <CheckField
          label="somebody asked about a note of mine, or answered what I asked"
          checked={mails.questions}
          onChecked={(questions) => setMails({ questions })}
        />
        <CheckField
          label="a new note fits one of my saved searches, at most once a day"
          checked={mails.savedSearches}
          onChecked={(savedSearches) => setMails({ savedSearches })}
        />
        {me.role !== 'member' && (
          <CheckField
            label="a note was handed in and waits on the desk"
            checked={mails.desk}
            onChecked={(desk) => setMails({ desk })}
          />
        )}
        <p className="text-note text-soot-2">
          Mails about your password and your address always come.{' '}
          <Link to={paths.savedSearches} className="link">
            Your saved searches
          </Link>
        </p>
      </Aside>
      <FormFoot>
        <Button type="submit" kind="main" busy={saving.isPending}>
          Save these settings
        </Button>
      </FormFoot>
    </SettingsForm>
  );
}

/** Several yeses under one label, in the columns of the other fields. */
function Aside({
  label,
  children,
}: {
  readonly label: string;
  readonly children: React.ReactNode;
}) {
  return (
    <fieldset className="grid min-w-0 gap-x-5 py-2 @2xl:grid-cols-[10.5rem_minmax(0,1fr)]">
      <legend className="contents">
        <span className="text-small font-[550] text-soot @2xl:col-start-1 @2xl:row-start-1 @2xl:pt-3 @2xl:text-soot-2 @2xl:font-[450]">
          {label}
        </span>
      </legend>
      <div className="min-w-0 @2xl:col-start-2">{children}</div>
    </fieldset>
  );
}
