import { useState } from 'react';
import { Button } from './button.tsx';

type State = { kind: 'idle' } | { kind: 'asking' } | { kind: 'failed'; because: string };

const because: Record<number, string> = {
  1: 'This browser may not tell where it is. Type the position, or allow it in the browser’s settings.',
  2: 'No position to be had just now. Step outside, or type it.',
  3: 'It took too long to find the position. Try again outside, or type it.',
};
const timeoutMs = 20_000;
/** Five digits after the point are about a metre. */
const digits = 5;

/** Fills a position in from the device. */
export function UseMyPlace({ take }: { take: (position: { latitude: string; longitude: string }) => void }) {
  const [state, setState] = useState<State>({ kind: 'idle' });
  if (!('geolocation' in navigator)) return null;

  function ask() {
    setState({ kind: 'asking' });
    navigator.geolocation.getCurrentPosition(
      ({ coords }) => {
        take({ latitude: coords.latitude.toFixed(digits), longitude: coords.longitude.toFixed(digits) });
        setState({ kind: 'idle' });
      },
      (error) => setState({ kind: 'failed', because: because[error.code] ?? because[2]! }),
      { enableHighAccuracy: true, timeout: timeoutMs },
    );
  }

  return (
    <div className="col-span-full">
      <Button variant="quiet" onClick={ask} busy={state.kind === 'asking'}>
        Use my location
      </Button>
      {state.kind === 'failed' && <p role="alert">{state.because}</p>}
    </div>
  );
}
