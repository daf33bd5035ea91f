import { escapeHtml } from '../delivery/email/message.ts';
import { lateMark } from '../delivery/payloads.ts';
import type { Sign } from './told.ts';

// Read by day and by night: dark mode is asked for by both the meta tag and the media query, and no meaning hangs on colour alone.
const style = `
:root { color-scheme: light dark; supported-color-schemes: light dark; }
body { margin: 0; background: #fbf7ee; color: #23261f; font: 17px/1.5 system-ui, -apple-system, 'Segoe UI', Roboto, sans-serif; }
main { max-width: 560px; margin: 0 auto; padding: 24px; }
h1 { font-size: 24px; line-height: 1.25; margin: 0 0 16px; }
.sign { font-size: 34px; line-height: 1; margin: 0 0 8px; color: #b97a1c; }
.open { display: inline-block; padding: 13px 22px; border-radius: 10px; background: #2f5d50; color: #ffffff; text-decoration: none; font-weight: 600; }
.small { font-size: 14px; color: #5c5f55; }
@media (prefers-color-scheme: dark) {
  body { background: #1a1d2e; color: #efe9da; }
  .sign { color: #f0b95b; }
  .open { background: #7fb8a4; color: #14221d; }
  .small { color: #b8b4a6; }
}`;

/** The disc over, under or on the horizon, as text: images are often blocked. */
const signs: Record<Sign, string> = { go: '●', hold: '◡', unknown: '○' };

/** A letter in one column, without images, that reads in light and dark. All texts are plain and are escaped here. */
export function letterHtml(parts: { language: string; title: string; sign: Sign | null; paragraphs: string[]; link: { text: string; url: string } | null; small: string[] }): string {
  const { language, title, sign, paragraphs, link, small } = parts;
  return `<!doctype html>
<html lang="${escapeHtml(language)}">
<head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><meta name="color-scheme" content="light dark"><meta name="supported-color-schemes" content="light dark"><title>${escapeHtml(title)}</title><style>${style}</style></head>
<body><main>
${sign ? `<p class="sign" aria-hidden="true">${signs[sign]}</p>` : ''}
<h1>${escapeHtml(title)}</h1>
${lateMark}
${paragraphs.map((text) => `<p>${escapeHtml(text)}</p>`).join('\n')}
${link ? `<p><a class="open" href="${escapeHtml(link.url)}">${escapeHtml(link.text)}</a></p>` : ''}
${small.map((text) => `<p class="small">${escapeHtml(text)}</p>`).join('\n')}
</main></body>
</html>
`;
}
