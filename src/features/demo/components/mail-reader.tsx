import { useState } from 'react';
import type { z } from 'zod';
import type { demoMailSchema } from '../../../../shared/api/system.ts';

/** One letter, as its HTML or as its plain text. */
export function MailReader({ mail }: { mail: z.infer<typeof demoMailSchema> }) {
  const [as, setAs] = useState<'html' | 'text'>(mail.html ? 'html' : 'text');
  return (
    <article aria-label={mail.subject}>
      <h2>{mail.subject}</h2>
      <p className="text-sm text-ink-soft">
        from {mail.from} to {mail.to}
      </p>
      <div className="my-3 flex gap-2">
        {(['html', 'text'] as const).map((kind) => (
          <button key={kind} type="button" className="ribbon-choice" aria-pressed={as === kind} onClick={() => setAs(kind)}>
            {kind === 'html' ? 'As sent' : 'Plain text'}
          </button>
        ))}
      </div>
      {as === 'html' ? (
        // No script runs in it, and a link opens outside of it.
        <iframe title={`Letter: ${mail.subject}`} sandbox="allow-popups allow-popups-to-escape-sandbox" srcDoc={mail.html.replace(/<a /gi, '<a target="_blank" ')} className="h-[60dvh] w-full rounded-lg border border-ink/15 bg-white" />
      ) : (
        <pre className="rounded-lg border border-ink/15 bg-paper-raised p-4 font-sans whitespace-pre-wrap">{mail.text}</pre>
      )}
    </article>
  );
}
