import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { roles, type Role } from '../../../../shared/rules/authorization.ts';
import type { Invitation, Member } from '../../../../shared/api/people.ts';
import { Button, Dialog, useToast } from '../../../components/index.ts';
import { roleWords } from '../../../lib/role-words.ts';
import { useFarm, useMay, useMe, useReader } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { peopleQuery, useChangeRole, useRemovePerson, useRevokeInvitation } from '../api/people.ts';

/** Who belongs to the farm, and who is invited. */
export function MemberList() {
  const { id: farmId } = useFarm();
  const { data } = useSuspenseQuery(peopleQuery(farmId));
  return (
    <ul className="divide-y divide-ink/10">
      {data.members.map((member) => (
        <MemberRow key={member.id} member={member} />
      ))}
      {data.invitations.map((invitation) => (
        <InvitationRow key={invitation.id} invitation={invitation} />
      ))}
    </ul>
  );
}

function MemberRow({ member }: { member: Member }) {
  const { id: farmId } = useFarm();
  const me = useMe();
  const may = useMay();
  const toast = useToast();
  const changeRole = useChangeRole(farmId);
  const remove = useRemovePerson(farmId);
  const [asking, setAsking] = useState(false);
  const { id, name, email, role, userId } = member;
  const onError = (error: Error) => toast(error.message);
  return (
    <li className="flex flex-wrap items-center justify-between gap-3 py-3">
      <span>
        <span className="block font-semibold">
          {name}
          {userId === me.id && ' (you)'}
        </span>
        <span className="block text-sm text-ink-soft">{email}</span>
      </span>
      {may('update', 'person') ? (
        <span className="flex gap-2">
          <select
            aria-label={`Role of ${name}`}
            className="min-h-touch rounded border bg-transparent px-3"
            value={changeRole.isPending ? changeRole.variables.role : role}
            onChange={(event) => changeRole.mutate({ id, role: event.target.value as Role }, { onSuccess: (changed) => toast(`${name} is now ${roleWords[changed.role].name.toLowerCase()}.`), onError })}
          >
            {roles.map((each) => (
              <option key={each} value={each}>
                {roleWords[each].name}
              </option>
            ))}
          </select>
          <Button variant="quiet" onClick={() => setAsking(true)}>
            Remove
          </Button>
          <Dialog open={asking} onClose={() => setAsking(false)} title={`Remove ${name}?`}>
            <p className="mb-4">They see nothing of the farm from then on, and get no more notices. To have them back, invite them again.</p>
            <div className="flex gap-2">
              <Button busy={remove.isPending} onClick={() => remove.mutate(id, { onSuccess: () => toast(`${name} no longer belongs to the farm.`), onError, onSettled: () => setAsking(false) })}>
                Remove {name}
              </Button>
              <Button variant="quiet" onClick={() => setAsking(false)}>
                Keep
              </Button>
            </div>
          </Dialog>
        </span>
      ) : (
        <span>{roleWords[role].name}</span>
      )}
    </li>
  );
}

function InvitationRow({ invitation }: { invitation: Invitation }) {
  const { id: farmId } = useFarm();
  const may = useMay();
  const reader = useReader();
  const toast = useToast();
  const revoke = useRevokeInvitation(farmId);
  const { id, email, role, invitedBy, expiresAt } = invitation;
  return (
    <li className="flex flex-wrap items-center justify-between gap-3 py-3">
      <span>
        <span className="block font-semibold">{email}</span>
        <span className="block text-sm text-ink-soft">
          Invited as {roleWords[role].name.toLowerCase()} by {invitedBy}; open until {dateTime(expiresAt, reader)}
        </span>
      </span>
      {may('archive', 'person') && (
        <Button variant="quiet" busy={revoke.isPending} onClick={() => revoke.mutate(id, { onSuccess: () => toast(`The invitation of ${email} is taken back.`), onError: (error) => toast(error.message) })}>
          Take back
        </Button>
      )}
    </li>
  );
}
