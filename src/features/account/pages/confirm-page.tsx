import { Link } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';
import { useConfirmEmail } from '../api/account.ts';
import { OutsidePage } from '../components/outside-page.tsx';
import { BrokenLink, TokenAction, useToken } from '../components/token-action.tsx';

export function ConfirmPage() {
  const token = useToken();
  const confirm = useConfirmEmail();
  return (
    <OutsidePage title="Confirm your address">
      {token ? (
        <TokenAction
          label="Yes, this is my address"
          act={() => confirm.mutateAsync(token)}
          done={
            <p>
              The address is confirmed.{' '}
              <Link className="underline" to={paths.home()}>
                Go on
              </Link>
            </p>
          }
        />
      ) : (
        <BrokenLink />
      )}
    </OutsidePage>
  );
}
