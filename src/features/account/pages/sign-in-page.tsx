import { useQuery } from '@tanstack/react-query';
import { Link, Navigate, useSearchParams } from 'react-router-dom';
import { signInBody } from '../../../../shared/api/accounts.ts';
import { TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { paths, safeNext } from '../../../lib/paths.ts';
import { meQuery } from '../../../lib/session/get-me.ts';
import { useSignIn } from '../api/sign-in.ts';
import { DemoSignIns } from '../components/demo-sign-ins.tsx';
import { OutsidePage } from '../components/outside-page.tsx';

export function SignInPage() {
  const [search] = useSearchParams();
  const { data: me } = useQuery(meQuery);
  const signIn = useSignIn();
  const form = useTypedForm({ schema: signInBody, numbers: {}, stored: { email: '', password: '' }, save: signIn.mutateAsync });
  // Signing in puts the person into the cache; this leads on.
  if (me) return <Navigate to={safeNext(search.get('next'))} replace />;
  return (
    <OutsidePage title="Sign in">
      <p>Whether tomorrow morning is fit for spraying, and why.</p>
      <DemoSignIns />
      <RecordForm form={form} saveLabel="Sign in">
        <Fields columns={1}>
          <TextField {...form.bind('email')} label="E-mail" type="email" autoComplete="username" required />
          <TextField {...form.bind('password')} label="Password" type="password" autoComplete="current-password" required />
        </Fields>
      </RecordForm>
      <p className="flex flex-wrap gap-x-6">
        <Link className="inline-flex min-h-touch items-center underline" to={paths.forgot()}>
          Forgot the password
        </Link>
        <Link className="inline-flex min-h-touch items-center underline" to={paths.signUp()}>
          Open an account
        </Link>
      </p>
    </OutsidePage>
  );
}
