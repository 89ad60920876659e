import { createTransport } from 'nodemailer';
import { describe, expect, it } from 'vitest';
import { setLetter } from './letter';
import { readMessage } from './read-message';

/** A message as nodemailer, the reference here, writes it. */
async function written(mail: { subject: string; text: string; html?: string }): Promise<Buffer> {
  const transport = createTransport({ streamTransport: true, buffer: true });
  const { message } = await transport.sendMail({ from: 'Oriel <oriel@localhost>', to: 'Åsa <asa@example.org>', ...mail });
  return message as Buffer;
}

describe('reading a message', () => {
  it.each([
    ['plain letters', 'Confirm your address', 'Follow this link.'],
    ['accents and signs', 'Häuschen — für Zoë', 'Grüße, “Zoë” — 1 = 1 & <b>'],
    ['a long subject of another script', '窓から見える景色についてのとても長い件名です'.repeat(4), '窓\n景色\n'],
    ['long lines', 'A', `${'x'.repeat(200)}=${'ü'.repeat(300)}`],
  ])('gives back what was sent: %s (nodemailer as reference; computed)', async (_what, subject, text) => {
    const read = readMessage(await written({ subject, text, html: `<p>${text}</p>` }));
    expect(read.subject).toBe(subject);
    expect(read.text.replace(/\r\n/g, '\n').trimEnd()).toBe(text.trimEnd());
    expect(read.html?.replace(/\r\n/g, '\n').trimEnd()).toBe(`<p>${text}</p>`);
    expect(read.from).toBe('Oriel <oriel@localhost>');
    expect(read.to).toBe('Åsa <asa@example.org>');
    expect(Number.isNaN(Date.parse(read.date))).toBe(false);
  });

  it('reads a message of text alone', async () => {
    const read = readMessage(await written({ subject: 'Hello', text: 'Only text, ünï' }));
    expect(read.text.trim()).toBe('Only text, ünï');
    expect(read.html).toBeNull();
  });
});

describe('a letter', () => {
  it('security: escapes whatever names it carries', () => {
    const { html } = setLetter({
      to: 'a@example.org',
      subject: '<img src=x onerror=alert(1)>',
      paragraphs: ['"><script>alert(1)</script>'],
      action: { label: '<b>', href: 'http://localhost/"onclick="x' },
      note: "it's & that",
    });
    expect(html).not.toMatch(/<script|<img|<b>|"onclick/);
    expect(html).toContain('it&#39;s &amp; that');
  });
});
