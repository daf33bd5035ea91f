import { useState } from 'react';
import { invitationBody } from '../../../../shared/api/people.ts';
import { roles, type Role } from '../../../../shared/rules/authorization.ts';
import { useToast } from '../../../components/index.ts';
import { ChoiceField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { roleWords } from '../../../lib/role-words.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { useInvite } from '../api/people.ts';

/** Invites by e-mail; a fresh form follows each invitation. */
export function InviteForm() {
  const [sent, setSent] = useState(0);
  return <OneInvitation key={sent} done={() => setSent(sent + 1)} />;
}

function OneInvitation({ done }: { done: () => void }) {
  const { id: farmId } = useFarm();
  const toast = useToast();
  const invite = useInvite(farmId);
  const role: Role = 'crew';
  const form = useTypedForm({
    schema: invitationBody,
    numbers: {},
    stored: { email: '', role },
    save: async (body) => {
      const { email } = await invite.mutateAsync(body);
      toast(`An invitation is on its way to ${email}.`);
      done();
    },
  });
  return (
    <RecordForm form={form} saveLabel="Send the invitation">
      <Fields>
        <TextField {...form.bind('email')} label="Their e-mail" type="email" autoComplete="off" required />
        <ChoiceField {...form.bind('role')} label="Role" hint={roles.map((each) => `${roleWords[each].name}: ${roleWords[each].hint.toLowerCase()}`).join(' ')} choices={roles.map((each) => [each, roleWords[each].name])} />
      </Fields>
    </RecordForm>
  );
}
