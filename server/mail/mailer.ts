import { createTransport } from 'nodemailer';
import type { Logger } from 'pino';

export interface Mail {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

export interface Mailer {
  /**
   * Takes a mail to be sent and returns at once: neither the time of an answer nor its success tells whether a mail went out.
   * A mail that cannot be delivered is tried again twice, then logged.
   */
  send(mail: Mail): void;
  /** Resolves when every mail taken so far is sent or given up. */
  settled(): Promise<void>;
}

const retryDelaysMs = [2_000, 10_000];
const pause = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms).unref());

/** @param deliver hands one mail over; rejects when it could not. */
export function createMailer(deliver: (mail: Mail) => Promise<void>, log: Logger, delaysMs: readonly number[] = retryDelaysMs): Mailer {
  const underWay = new Set<Promise<void>>();
  const deliverPersistently = async (mail: Mail) => {
    for (const delayMs of [...delaysMs, null]) {
      try {
        return await deliver(mail);
      } catch (error) {
        if (delayMs === null) return log.error({ err: error }, 'a mail could not be sent');
        await pause(delayMs);
      }
    }
  };
  return {
    send(mail) {
      const delivery = deliverPersistently(mail).finally(() => underWay.delete(delivery));
      underWay.add(delivery);
    },
    async settled() {
      while (underWay.size > 0) await Promise.all(underWay);
    },
  };
}

/** Delivers over SMTP (RFC 5321). */
export function smtpDelivery(smtpUrl: string, from: string): (mail: Mail) => Promise<void> {
  const transport = createTransport(smtpUrl);
  return async (mail) => {
    await transport.sendMail({ from, ...mail });
  };
}
