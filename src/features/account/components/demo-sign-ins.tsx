import { useQuery } from '@tanstack/react-query';
import { Button, useToast } from '../../../components/index.ts';
import { demoStatusQuery } from '../../../lib/session/get-demo-status.ts';
import { useSignIn } from '../api/sign-in.ts';

/** In the demo, the people of the invented farm: one tap signs in as one of them. */
export function DemoSignIns() {
  const { data: status } = useQuery(demoStatusQuery);
  const signIn = useSignIn();
  const toast = useToast();
  if (!status?.demo) return null;
  return (
    <section aria-label="Demo sign-ins" className="space-y-2 rounded-lg bg-straw-pale p-4 text-ink">
      <p>This is a demo: farm, people and products are invented. Come in as</p>
      <div className="grid gap-2 sm:grid-cols-2">
        {status.signIns.map(({ name, email, password, role }) => (
          <Button key={email} variant="quiet" busy={signIn.isPending && signIn.variables.email === email} onClick={() => signIn.mutate({ email, password }, { onError: (error) => toast(error.message) })}>
            {name}, {role}
          </Button>
        ))}
      </div>
    </section>
  );
}
