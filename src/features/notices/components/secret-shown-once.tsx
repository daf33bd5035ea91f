import { useState } from 'react';
import { Button } from '../../../components/index.ts';

/** A secret that the server shows once: to be copied now. */
export function SecretShownOnce({ name, secret }: { name: string; secret: string }) {
  const [copied, setCopied] = useState(false);
  return (
    <div role="status" className="my-4 space-y-2 rounded-lg bg-straw-pale p-4 text-ink">
      <p>
        The signing secret of <strong>{name}</strong>. It is shown this once: keep it where the other machine can read it.
      </p>
      <p className="font-mono break-all select-all">{secret}</p>
      {'clipboard' in navigator && (
        <Button variant="quiet" onClick={() => void navigator.clipboard.writeText(secret).then(() => setCopied(true))}>
          {copied ? 'Copied' : 'Copy'}
        </Button>
      )}
    </div>
  );
}
