import { escapeHtml } from './letter';
import type { KeptMessage } from './local-smtp';

const face = (family: string, file: string, weights: string) =>
  `@font-face{font-family:'${family}';font-weight:${weights};font-display:swap;src:url('/fonts/${file}.woff2') format('woff2')}`;

const style = `
${face('Newsreader', 'newsreader/newsreader-latin-opsz-normal', '200 800')}
${face('Instrument Sans', 'instrument-sans/instrument-sans-latin-wght-normal', '400 700')}
:root{color-scheme:light dark;--plaster:#F4F1EA;--ink:#22303A;--pencil:#5F6569;--line:#C9C2B2;--hairline:#DDD7C9;--brass:#8A6116}
@media (prefers-color-scheme:dark){:root{--plaster:#15191C;--ink:#E8E2D5;--pencil:#9AA0A0;--line:#3B4247;--hairline:#2A3034;--brass:#D9B36A}}
body{margin:0;background:var(--plaster);color:var(--ink);font:15px/1.55 'Instrument Sans','Helvetica Neue',Arial,sans-serif}
main{max-width:760px;margin:0 auto;padding:32px 24px 64px}
header{padding-bottom:12px;border-bottom:1px solid var(--line);display:flex;gap:24px;justify-content:space-between;align-items:baseline;flex-wrap:wrap}
h1,header a.name{font:500 24px/1.25 Newsreader,Georgia,serif}
header a.name{color:var(--ink);text-decoration:none}
h1{margin:28px 0 8px}
p.note,time,dt{color:var(--pencil);font-size:13px}
a{color:var(--brass)}
a:focus-visible{outline:2px solid var(--brass);outline-offset:3px}
ol{list-style:none;margin:24px 0;padding:0}
li{display:grid;grid-template-columns:1fr auto;gap:2px 16px;padding:12px 0;border-bottom:1px solid var(--hairline)}
li a{font-weight:550}
li span{grid-row:2;overflow-wrap:anywhere}
dl{display:grid;grid-template-columns:max-content 1fr;gap:4px 16px;margin:16px 0 24px}
dt,dd{margin:0}
dd{overflow-wrap:anywhere}
pre{margin:0;padding:24px 0;border-block:1px solid var(--hairline);white-space:pre-wrap;overflow-wrap:anywhere;font:inherit}`;

const page = (title: string, body: string) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><link rel="icon" type="image/svg+xml" href="/assets/oriel.svg"><title>${escapeHtml(title)} · Oriel</title>
<style>${style}</style></head>
<body><main><header><a class="name" href="/">Oriel</a><span>Mail kept on this machine</span></header>
${body}
</main></body></html>
`;

const time = (date: string) => {
  const moment = new Date(date);
  return Number.isNaN(moment.getTime()) ? '' : `<time datetime="${moment.toISOString()}">${moment.toISOString().slice(0, 16).replace('T', ' ')} UTC</time>`;
};

/** Escaped text in which addresses can be followed. */
const linked = (text: string) => escapeHtml(text).replace(/https?:\/\/[^\s<]+/g, (href) => `<a href="${href}">${href}</a>`);

export function messagesView(messages: readonly KeptMessage[]): string {
  const note =
    '<p class="note">This server has no mail server (SMTP_URL is not set), so it keeps here what it would have sent: the last 200 mails, until it stops. Unless MAIL_PAGE says otherwise, only somebody at this machine sees this page.</p>';
  if (messages.length === 0) return page('Mail', `<h1>No mail yet</h1>${note}<p>Sign up or ask for a new password, then reload this page.</p>`);
  const rows = messages.map(
    ({ id, subject, to, date }) => `<li><a href="/mail/${id}">${escapeHtml(subject)}</a>${time(date)}<span>to ${escapeHtml(to)}</span></li>`,
  );
  return page('Mail', `<h1>Mail</h1>${note}<ol>${rows.join('\n')}</ol>`);
}

export function messageView({ id, from, to, subject, date, text, html }: KeptMessage): string {
  const asSet = html === null ? '' : `<p><a href="/mail/${id}/set">See it as a mail program shows it</a></p>`;
  return page(
    subject,
    `<p><a href="/mail">All mail</a></p><h1>${escapeHtml(subject)}</h1>
<dl><dt>From</dt><dd>${escapeHtml(from)}</dd><dt>To</dt><dd>${escapeHtml(to)}</dd><dt>Sent</dt><dd>${time(date)}</dd></dl>
<pre>${linked(text)}</pre>${asSet}`,
  );
}

export const goneView = () =>
  page('Mail', '<p><a href="/mail">All mail</a></p><h1>This mail is gone</h1><p>Mail is kept here only until the server stops. Ask for it to be sent again.</p>');
