import { useQuery } from '@tanstack/react-query';
import { Link, useLocation } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';
import { meQuery } from '../../../lib/session/get-me.ts';
import { useAcceptInvitation } from '../api/account.ts';
import { OutsidePage } from '../components/outside-page.tsx';
import { BrokenLink, TokenAction, useToken } from '../components/token-action.tsx';

/** Joins a farm by the link of an invitation; whoever is not signed in does that first and comes back. */
export function InvitationPage() {
  const token = useToken();
  const { pathname, search } = useLocation();
  const { data: me } = useQuery(meQuery);
  const accept = useAcceptInvitation();
  if (!token) {
    return (
      <OutsidePage title="Invitation">
        <BrokenLink />
      </OutsidePage>
    );
  }
  return (
    <OutsidePage title="Invitation">
      {me ? (
        <>
          <p>You are signed in as {me.email}. An invitation is for the address that it was sent to.</p>
          <TokenAction
            label="Join the farm"
            act={() => accept.mutateAsync(token)}
            done={
              <p>
                Welcome.{' '}
                <Link className="underline" to={paths.daybreak(accept.data?.farms.at(-1)?.id ?? '')}>
                  To the farm
                </Link>
              </p>
            }
          />
        </>
      ) : (
        <>
          <p>You are invited to a farm. Sign in with the address the invitation came to, or open an account with it; then open the link again.</p>
          <p className="flex gap-6">
            <Link className="inline-flex min-h-touch items-center font-semibold underline" to={paths.signIn(pathname + search)}>
              Sign in
            </Link>
            <Link className="inline-flex min-h-touch items-center underline" to={paths.signUp()}>
              Open an account
            </Link>
          </p>
        </>
      )}
    </OutsidePage>
  );
}
