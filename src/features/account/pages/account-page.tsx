import { Link, useNavigate } from 'react-router-dom';
import { changePasswordBody, profileBody } from '../../../../shared/api/accounts.ts';
import { useState } from 'react';
import { Button, PageHeading, Panel, ThemeToggle, useToast } from '../../../components/index.ts';
import { ChoiceField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { paths } from '../../../lib/paths.ts';
import { roleWords } from '../../../lib/role-words.ts';
import { useMe } from '../../../lib/session/session.ts';
import { useChangePassword, useUpdateMe } from '../api/account.ts';
import { useSignOut } from '../api/sign-in.ts';
import { unitChoices } from '../words.ts';

export function AccountPage() {
  const me = useMe();
  const signOut = useSignOut();
  const navigate = useNavigate();
  return (
    <>
      <PageHeading title="You" over={me.email}>
        <Button variant="quiet" busy={signOut.isPending} onClick={() => signOut.mutate(undefined, { onSuccess: () => void navigate(paths.signIn()) })}>
          Sign out
        </Button>
      </PageHeading>
      <Panel title="How you read">
        <Profile />
      </Panel>
      <Panel title="How it looks">
        <ThemeToggle />
      </Panel>
      <Panel title="Your farms">
        <ul>
          {me.farms.map(({ id, name, role }) => (
            <li key={id}>
              <Link to={paths.daybreak(id)} className="inline-flex min-h-touch items-center gap-2">
                <span className="font-semibold underline">{name}</span> <span className="text-ink-soft">{roleWords[role].name}</span>
              </Link>
            </li>
          ))}
        </ul>
        <Link to={paths.newFarm()} className="inline-flex min-h-touch items-center underline">
          Open another farm
        </Link>
      </Panel>
      <Panel title="Password">
        <Password />
      </Panel>
    </>
  );
}

function Profile() {
  const me = useMe();
  const update = useUpdateMe();
  const toast = useToast();
  const { name, units, language } = me;
  const form = useTypedForm({
    schema: profileBody,
    numbers: {},
    stored: { name, units, language },
    save: async (body) => {
      await update.mutateAsync(body);
      toast('Saved.');
    },
  });
  return (
    <RecordForm form={form} saveLabel="Save">
      <Fields>
        <TextField {...form.bind('name')} label="Your name" autoComplete="name" required />
        <ChoiceField {...form.bind('units')} label="Units" choices={unitChoices} />
        <ChoiceField
          {...form.bind('language')}
          label="Language of your notices"
          choices={[
            ['en', 'English'],
            ['es', 'Español'],
          ]}
        />
      </Fields>
    </RecordForm>
  );
}

function Password() {
  // A fresh form after each change: no password stays on the page.
  const [changed, setChanged] = useState(0);
  return <PasswordForm key={changed} done={() => setChanged(changed + 1)} />;
}

function PasswordForm({ done }: { done: () => void }) {
  const change = useChangePassword();
  const toast = useToast();
  const form = useTypedForm({
    schema: changePasswordBody,
    numbers: {},
    stored: { currentPassword: '', newPassword: '' },
    save: async (body) => {
      await change.mutateAsync(body);
      toast('The new password holds; every other device is signed out.');
      done();
    },
  });
  return (
    <RecordForm form={form} saveLabel="Change the password">
      <Fields>
        <TextField {...form.bind('currentPassword')} label="Password so far" type="password" autoComplete="current-password" required />
        <TextField {...form.bind('newPassword')} label="New password" type="password" autoComplete="new-password" hint="At least 10 characters; several words are easy to keep." required />
      </Fields>
    </RecordForm>
  );
}
