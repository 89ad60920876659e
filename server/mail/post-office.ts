import type { Logger } from 'pino';
import type { Config } from '../config';
import { startLocalSmtp } from './local-smtp';
import { createMailPage, type MailPage } from './mail-page';
import { createMailer, smtpDelivery, type Mailer } from './mailer';

export interface PostOffice {
  readonly mailer: Mailer;
  readonly mailPage: MailPage | null;
  close(): Promise<void>;
}

/** Sends through the mail server of the settings; without one, over SMTP to a local one whose mail a page shows. */
export async function openPostOffice(config: Config, log: Logger): Promise<PostOffice> {
  if (config.smtpUrl) {
    const mailer = createMailer(smtpDelivery(config.smtpUrl, config.mailFrom), log);
    return { mailer, mailPage: null, close: () => mailer.settled() };
  }
  const local = await startLocalSmtp();
  const mailer = createMailer(smtpDelivery(local.url, config.mailFrom), log);
  return {
    mailer,
    mailPage: createMailPage(local.messages, config.mailPage === 'anyone'),
    close: async () => {
      await mailer.settled();
      await local.close();
    },
  };
}
