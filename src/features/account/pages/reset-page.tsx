import { useState } from 'react';
import { Link } from 'react-router-dom';
import { resetBody } from '../../../../shared/api/accounts.ts';
import { TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { paths } from '../../../lib/paths.ts';
import { useResetPassword } from '../api/account.ts';
import { OutsidePage } from '../components/outside-page.tsx';
import { BrokenLink, useToken } from '../components/token-action.tsx';

const newPasswordBody = resetBody.pick({ password: true });

export function ResetPage() {
  const token = useToken();
  return <OutsidePage title="Set a new password">{token ? <ResetForm token={token} /> : <BrokenLink />}</OutsidePage>;
}

function ResetForm({ token }: { token: string }) {
  const reset = useResetPassword();
  const [done, setDone] = useState(false);
  const form = useTypedForm({
    schema: newPasswordBody,
    numbers: {},
    stored: { password: '' },
    save: async ({ password }) => {
      await reset.mutateAsync({ token, password });
      setDone(true);
    },
  });
  if (done) {
    return (
      <p role="status">
        The new password holds from now on, and you are signed out everywhere.{' '}
        <Link className="underline" to={paths.signIn()}>
          Sign in
        </Link>
      </p>
    );
  }
  return (
    <RecordForm form={form} saveLabel="Set the password">
      <Fields columns={1}>
        <TextField {...form.bind('password')} label="New password" type="password" autoComplete="new-password" hint="At least 10 characters; several words are easy to keep." required />
      </Fields>
    </RecordForm>
  );
}
