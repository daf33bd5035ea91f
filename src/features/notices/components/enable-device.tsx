import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Button, useToast } from '../../../components/index.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { pushKeyQuery, useAddDevice } from '../api/devices.ts';
import { guessDeviceName, readPushState, rememberDevice, subscribeToPush, type PushState } from '../push.ts';

const explanations: Record<Exclude<PushState, 'ask' | 'granted'>, string> = {
  unsupported: 'This browser cannot receive a push. Use a current browser on your phone, or have the notices sent by e-mail below.',
  needsHomeScreen: 'An iPhone or iPad takes a push only from its home screen: tap Share, then “Add to Home Screen”, open Dawnvane from there, sign in, and come back to this page.',
  denied: 'Notices from this site are blocked in this browser. Open the site’s settings (the sign left of the address), allow notifications, and load this page again.',
};

/** Enables the device in hand with one tap, or says plainly what it needs first. */
export function EnableDevice() {
  const { id: farmId } = useFarm();
  const client = useQueryClient();
  const add = useAddDevice(farmId);
  const toast = useToast();
  const [state, setState] = useState(readPushState);
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  async function enable() {
    setBusy(true);
    setProblem(null);
    try {
      const address = await subscribeToPush(await client.ensureQueryData(pushKeyQuery));
      const name = guessDeviceName(navigator.userAgent);
      await add.mutateAsync({ name, ...address });
      await rememberDevice(farmId, name);
      toast('This device is enabled. Send it a test notice to be sure.');
    } catch (error) {
      setProblem(error instanceof Error ? error.message : 'That did not work. Try again.');
    } finally {
      setState(readPushState());
      setBusy(false);
    }
  }

  if (state !== 'ask' && state !== 'granted') return <p>{explanations[state]}</p>;
  return (
    <div className="space-y-3">
      <p>{state === 'granted' ? 'This browser allows notices.' : 'The browser will ask once whether notices may be shown.'}</p>
      <Button onClick={() => void enable()} busy={busy}>
        Enable this device
      </Button>
      {problem && <p role="alert">{problem}</p>}
    </div>
  );
}
