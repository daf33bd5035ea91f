import { useState } from 'react';
import { Link } from 'react-router-dom';
import { signUpBody, type Units } from '../../../../shared/api/accounts.ts';
import { ChoiceField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { paths } from '../../../lib/paths.ts';
import { useSignUp } from '../api/account.ts';
import { OutsidePage } from '../components/outside-page.tsx';
import { unitChoices } from '../words.ts';

export function SignUpPage() {
  const signUp = useSignUp();
  const [sentTo, setSentTo] = useState<string | null>(null);
  const units: Units = 'us';
  const form = useTypedForm({
    schema: signUpBody,
    numbers: {},
    stored: { name: '', email: '', password: '', units, language: 'en' as const },
    save: async (body) => {
      await signUp.mutateAsync(body);
      setSentTo(body.email);
    },
  });
  if (sentTo) {
    return (
      <OutsidePage title="Look into your mailbox">
        <p>A letter is on its way to {sentTo}. Open it and confirm the address; then sign in.</p>
      </OutsidePage>
    );
  }
  return (
    <OutsidePage title="Open an account">
      <RecordForm form={form} saveLabel="Open the account">
        <Fields columns={1}>
          <TextField {...form.bind('name')} label="Your name" autoComplete="name" required />
          <TextField {...form.bind('email')} label="E-mail" type="email" autoComplete="username" required />
          <TextField {...form.bind('password')} label="Password" type="password" autoComplete="new-password" hint="At least 10 characters; several words are easy to keep." required />
          <ChoiceField {...form.bind('units')} label="Units" choices={unitChoices} />
        </Fields>
      </RecordForm>
      <p>
        <Link className="inline-flex min-h-touch items-center underline" to={paths.signIn()}>
          I have an account
        </Link>
      </p>
    </OutsidePage>
  );
}
