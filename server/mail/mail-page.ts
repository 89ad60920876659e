import type { Request } from 'express';

/** The page that shows the mail this server did not send. */
export interface MailPage {
  readonly address: string;
  /** Whether this asker may see it: it shows links that reset passwords. */
  isOpenTo(request: Request): boolean;
}
