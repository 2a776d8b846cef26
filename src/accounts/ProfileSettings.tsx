import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { Me } from '#shared/api/accounts.ts';
import { paths } from '#shared/paths.ts';
import { noteQueries } from '../notes/note-queries.ts';
import { Button } from '../ui/Button.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { TextField } from '../ui/TextField.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { changeProfile } from './account-mutations.ts';
import { issuesAt } from './form-faults.ts';
import { FormFoot } from './FormFoot.tsx';
import { memberQueries } from './member-queries.ts';
import { rememberMe } from './session-cache.ts';
import { SettingsForm } from './SettingsSection.tsx';

const MAX_ABOUT = 1000;

/** What everybody sees of a member. */
export function ProfileSettings({ me }: { readonly me: Me }) {
  const client = useQueryClient();
  const tell = useMessages();
  const [name, setName] = useState(me.name);
  const [place, setPlace] = useState(me.place);
  const [about, setAbout] = useState(me.about);
  const saving = useMutation({
    mutationFn: changeProfile,
    networkMode: 'always',
    onSuccess: (saved) => {
      rememberMe(client, saved);
      // Spaces at the ends are not kept: the fields show what is.
      setName(saved.name);
      setPlace(saved.place);
      setAbout(saved.about);
      tell({ kind: 'done', text: 'Your page is saved.' });
      void client.invalidateQueries({ queryKey: memberQueries.all });
      void client.invalidateQueries({ queryKey: noteQueries.all });
    },
  });
  return (
    <SettingsForm
      id="your-page"
      heading="Your page"
      lead={
        <>
          Everybody sees this: all of it on{' '}
          <Link to={paths.member(me.id)} className="link">
            your page
          </Link>
          , and your name over your notes.
        </>
      }
      error={saving.error}
      fields={['/name', '/place', '/about']}
      onSubmit={() => {
        if (!saving.isPending) saving.mutate({ name, place, about });
      }}
    >
      <TextField
        label="Name"
        autoComplete="name"
        required
        value={name}
        onValue={setName}
        issues={issuesAt(saving.error, '/name')}
      />
      <TextField
        label="Place"
        autoComplete="off"
        value={place}
        onValue={setPlace}
        hint="A region is enough; it tells others about your weather and height."
        issues={issuesAt(saving.error, '/place')}
      />
      <TextArea
        label="About you"
        maxLength={MAX_ABOUT}
        value={about}
        onValue={setAbout}
        issues={issuesAt(saving.error, '/about')}
      />
      <FormFoot>
        <Button type="submit" kind="main" busy={saving.isPending}>
          Save your page
        </Button>
      </FormFoot>
    </SettingsForm>
  );
}
