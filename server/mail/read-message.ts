/** A message as the mail page shows it. */
export interface ReadMessage {
  readonly from: string;
  readonly to: string;
  readonly subject: string;
  readonly date: string;
  readonly text: string;
  readonly html: string | null;
}

interface Part {
  readonly headers: ReadonlyMap<string, string>;
  readonly body: string;
}

const headerEnd = /\r?\n\r?\n/;

/** Header fields by lower-case name, unfolded (RFC 5322, 2.2.3), and the body as it travelled. */
function split(source: string): Part {
  const end = headerEnd.exec(source);
  const head = end ? source.slice(0, end.index) : source;
  const fields = head
    .replace(/\r?\n[ \t]+/g, ' ')
    .split(/\r?\n/)
    .map((line): [string, string] => [line.slice(0, line.indexOf(':')).toLowerCase(), line.slice(line.indexOf(':') + 1).trim()]);
  return { headers: new Map(fields), body: end ? source.slice(end.index + end[0].length) : '' };
}

const quotedPrintable = (text: string) =>
  Buffer.from(
    text.replace(/=\r?\n/g, '').replace(/=([0-9A-F]{2})/gi, (_match, hex: string) => String.fromCharCode(parseInt(hex, 16))),
    'latin1',
  );

/** The body of a part as text: transfer encodings of RFC 2045, 6.7 and 6.8, in UTF-8. */
function decodeBody({ headers, body }: Part): string {
  const encoding = headers.get('content-transfer-encoding')?.toLowerCase();
  if (encoding === 'base64') return Buffer.from(body, 'base64').toString('utf8');
  if (encoding === 'quoted-printable') return quotedPrintable(body).toString('utf8');
  return Buffer.from(body, 'latin1').toString('utf8');
}

/** Encoded words in a header field, UTF-8 only (RFC 2047). */
function decodeWords(field = ''): string {
  return field
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([qb])\?([^?]*)\?=/gi, (_match, kind: string, word: string) => {
      const bytes = kind.toLowerCase() === 'b' ? Buffer.from(word, 'base64') : quotedPrintable(word.replace(/_/g, ' '));
      return bytes.toString('latin1');
    })
    .replace(/[^\0-\x7f]+/g, (bytes) => Buffer.from(bytes, 'latin1').toString('utf8'));
}

function* leaves(part: Part): Generator<Part> {
  const boundary = /boundary="?([^";]+)"?/i.exec(part.headers.get('content-type') ?? '')?.[1];
  if (!boundary) return yield part;
  for (const piece of part.body.split(`--${boundary}`).slice(1)) {
    if (!piece.startsWith('--')) yield* leaves(split(piece.replace(/^\r?\n/, '').replace(/\r?\n$/, '')));
  }
}

/** Reads a message as our own mailer writes it: UTF-8, at most multipart/alternative of plain text and HTML. */
export function readMessage(raw: Buffer): ReadMessage {
  const message = split(raw.toString('latin1'));
  const parts = [...leaves(message)];
  const ofType = (type: string) => parts.find((part) => part.headers.get('content-type')?.toLowerCase().startsWith(type));
  const html = ofType('text/html');
  const text = ofType('text/plain') ?? (html ? undefined : message);
  const field = (name: string) => decodeWords(message.headers.get(name));
  return {
    from: field('from'),
    to: field('to'),
    subject: field('subject'),
    date: field('date'),
    text: text ? decodeBody(text) : '',
    html: html ? decodeBody(html) : null,
  };
}
