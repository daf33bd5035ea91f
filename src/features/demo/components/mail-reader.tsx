import { useState } from 'react';
import type { z } from 'zod';
import type { demoMailSchema } from '../../../../shared/api/system.ts';

const stylePattern = /<style[^>]*>([\s\S]*?)<\/style>/gi;

/** Links open outside the frame; style sheets are put back by `dress`. */
const framed = (html: string): string => html.replace(stylePattern, '').replace(/<a /gi, '<a target="_blank" ');

/** Gives a letter its own style sheets, as a mail program would; the page's content security policy takes none from markup. */
function dress(frame: HTMLIFrameElement, html: string): void {
  const { contentDocument, contentWindow } = frame;
  if (!contentDocument || !contentWindow) return;
  const sheet = new (contentWindow as Window & typeof globalThis).CSSStyleSheet();
  sheet.replaceSync([...html.matchAll(stylePattern)].map(([, css]) => css).join('\n'));
  contentDocument.adoptedStyleSheets = [sheet];
}

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
        <iframe title={`Letter: ${mail.subject}`} sandbox="allow-same-origin allow-popups allow-popups-to-escape-sandbox" srcDoc={framed(mail.html)} onLoad={(event) => dress(event.currentTarget, mail.html)} className="h-[60dvh] w-full rounded-lg border border-ink/15 bg-white" />
      ) : (
        <pre className="rounded-lg border border-ink/15 bg-paper-raised p-4 font-sans whitespace-pre-wrap">{mail.text}</pre>
      )}
    </article>
  );
}
