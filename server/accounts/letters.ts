/** The letters of accounts, in plain words. */
export interface LetterText {
  subject: string;
  text: string;
  html: string;
}

const escape = (text: string): string => text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);

function letter(subject: string, paragraphs: string[], link: { label: string; url: string } | null): LetterText {
  const text = [...paragraphs, ...(link ? [`${link.label}:\n${link.url}`] : []), 'Dawnvane'].join('\n\n');
  const body = paragraphs.map((paragraph) => `<p>${escape(paragraph)}</p>`).join('');
  const button = link ? `<p><a href="${escape(link.url)}" style="display:inline-block;padding:14px 22px;background:#2f5d50;color:#fffdf8;border-radius:8px;text-decoration:none">${escape(link.label)}</a></p><p style="font-size:13px">${escape(link.url)}</p>` : '';
  const html = `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="color-scheme" content="light dark"></head><body style="font:17px/1.5 system-ui,sans-serif;max-width:34em;margin:0 auto;padding:24px">${body}${button}<p>Dawnvane</p></body></html>`;
  return { subject, text, html };
}

export const confirmLetter = (name: string, url: string): LetterText =>
  letter('Confirm your address for Dawnvane', [`Good day ${name},`, 'someone, we hope you, opened an account with this address. Confirm it, and notices can reach you here. The link holds for three days.', 'If it was not you, do nothing.'], { label: 'Confirm this address', url });

export const knownAddressLetter = (name: string, url: string): LetterText =>
  letter('You have an account with Dawnvane already', [`Good day ${name},`, 'someone tried to open an account with this address, but there is one already. If that was you, sign in, or set a new password.', 'If it was not you, do nothing.'], { label: 'Sign in', url });

export const resetLetter = (name: string, url: string): LetterText =>
  letter('Set a new password for Dawnvane', [`Good day ${name},`, 'use the link to set a new password. It holds for two hours and works once; you are then signed out everywhere.', 'If you did not ask for it, do nothing: your password stays.'], { label: 'Set a new password', url });

export const passwordChangedLetter = (name: string, url: string): LetterText =>
  letter('Your Dawnvane password was changed', [`Good day ${name},`, 'your password was changed just now, and every other device was signed out.', 'If it was not you, set a new password at once.'], { label: 'Set a new password', url });

export const invitationLetter = (farm: string, inviter: string, role: string, url: string): LetterText =>
  letter(`${inviter} invites you to ${farm}`, ['Good day,', `${inviter} invites you to ${farm} on Dawnvane as ${role}. Sign in, or open an account with this address, and accept. The link holds for two weeks.`], { label: 'See the invitation', url });
