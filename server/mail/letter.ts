import type { Mail } from './mailer';

/** What every mail of ours is made of: a few paragraphs, one thing to do, and a note at the foot. */
export interface Letter {
  readonly to: string;
  readonly subject: string;
  readonly paragraphs: readonly string[];
  readonly action: { readonly label: string; readonly href: string };
  readonly also?: { readonly label: string; readonly href: string };
  readonly note: string;
}

const escapes: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (character) => escapes[character]);

const serif = "Newsreader, Georgia, 'Times New Roman', serif";
const sans = "'Instrument Sans', 'Helvetica Neue', Arial, sans-serif";

/** Sets a letter in Oriel's hand (plaster, ink, brass), readable without pictures and as plain text. */
export function setLetter(letter: Letter): Mail {
  const { to, subject, paragraphs, action, also, note } = letter;
  const links = also ? [action, also] : [action];
  const text = [...paragraphs, ...links.map(({ label, href }) => `${label}:\n${href}`), note, '— Oriel'].join('\n\n') + '\n';

  const paragraph = (words: string) => `<p style="margin:0 0 16px">${escapeHtml(words)}</p>`;
  const second = also
    ? `<p style="margin:0 0 16px"><a href="${escapeHtml(also.href)}" style="color:#8A6116">${escapeHtml(also.label)}</a></p>`
    : '';
  const html = `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${escapeHtml(subject)}</title></head>
<body style="margin:0;background:#F4F1EA;color:#22303A;font:16px/1.5 ${sans}">
<div style="max-width:520px;margin:0 auto;padding:32px 24px">
<p style="margin:0;padding:0 0 12px;border-bottom:1px solid #C9C2B2;font:24px/1.2 ${serif}">Oriel</p>
<h1 style="margin:28px 0 16px;font:500 22px/1.3 ${serif}">${escapeHtml(subject)}</h1>
${paragraphs.map(paragraph).join('\n')}
<p style="margin:24px 0"><a href="${escapeHtml(action.href)}" style="display:inline-block;padding:9px 18px;border-radius:3px;background:#22303A;color:#FBF9F4;text-decoration:none">${escapeHtml(action.label)}</a></p>
${second}
<p style="margin:28px 0 0;padding:12px 0 0;border-top:1px solid #DDD7C9;font-size:13px;color:#5F6569">${escapeHtml(note)}</p>
</div></body></html>
`;
  return { to, subject, text, html };
}
