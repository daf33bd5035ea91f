import { useState } from 'react';
import { accountEndpoints } from '../../../../shared/api/accounts.ts';
import { TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { useRequestReset } from '../api/account.ts';
import { OutsidePage } from '../components/outside-page.tsx';

export function ForgotPage() {
  const request = useRequestReset();
  const [sentTo, setSentTo] = useState<string | null>(null);
  const form = useTypedForm({
    schema: accountEndpoints.requestReset.body,
    numbers: {},
    stored: { email: '' },
    save: async (body) => {
      await request.mutateAsync(body);
      setSentTo(body.email);
    },
  });
  if (sentTo) {
    return (
      <OutsidePage title="Look into your mailbox">
        <p>If {sentTo} belongs to an account, a letter with a link is on its way there. The link holds for two hours.</p>
      </OutsidePage>
    );
  }
  return (
    <OutsidePage title="Forgot the password">
      <p>Tell the address of your account; a letter brings a link to set a new password.</p>
      <RecordForm form={form} saveLabel="Send the letter">
        <Fields columns={1}>
          <TextField {...form.bind('email')} label="E-mail" type="email" autoComplete="username" required />
        </Fields>
      </RecordForm>
    </OutsidePage>
  );
}
