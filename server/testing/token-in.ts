import type { Mail } from '../mail/mailer';

/** The secret in the fragment of a mail's first link. @throws Error when there is none */
export function tokenIn(mail: Mail | undefined): string {
  const token = /#([A-Za-z0-9_-]{43})\s/.exec(mail?.text ?? '')?.[1];
  if (!token) throw new Error(`no link with a secret in: ${mail?.text ?? 'no mail'}`);
  return token;
}
