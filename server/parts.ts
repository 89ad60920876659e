import type { Logger } from 'pino';
import { createPasswords, type Passwords } from './accounts/passwords';
import { createSessions, type Sessions } from './accounts/sessions';
import type { Config } from './config';
import type { Connection } from './database/database';
import type { Changes } from './events/changes';
import { createEventStreams, type EventStreams } from './events/event-streams';
import { createLimits, usualLimits, type LimitSettings, type Limits } from './http/limits';
import { sessionCookie, type SessionCookie } from './http/session-cookie';
import { createWallCookie, type WallCookie } from './http/wall-cookie';
import { createXsrf, type Xsrf } from './http/xsrf';
import type { Jobs } from './jobs/jobs';
import type { MailPage } from './mail/mail-page';
import type { Mailer } from './mail/mailer';
import { layerFiles, type LayerFiles } from './scenes/layer-files';
import type { Storage } from './storage/storage';

/** What differs from server to server. */
export interface Given {
  readonly config: Config;
  readonly connection: Connection;
  readonly log: Logger;
  readonly storage: Storage;
  readonly jobs: Jobs;
  readonly changes: Changes;
  readonly mailer: Mailer;
  /** Where sent mail is shown, on a server without a mail server. */
  readonly mailPage: MailPage | null;
  /** True once the server has been asked to stop: it finishes what it has and takes nothing new. */
  readonly draining: () => boolean;
}

/** What tests make cheaper or stricter. */
export interface Chosen {
  readonly passwords?: Passwords;
  readonly limits?: LimitSettings;
}

/** What the features are built from. */
export interface Parts extends Given {
  readonly passwords: Passwords;
  readonly cookie: SessionCookie;
  readonly wallCookie: WallCookie;
  readonly eventStreams: EventStreams;
  readonly xsrf: Xsrf;
  readonly sessions: Sessions;
  readonly layerFiles: LayerFiles;
  readonly limits: Limits;
}

export function assemble({ passwords = createPasswords(), limits = usualLimits, ...given }: Given & Chosen): Parts {
  const secure = given.config.publicUrl.startsWith('https:');
  const cookie = sessionCookie(secure);
  const wallCookie = createWallCookie(secure);
  const xsrf = createXsrf(given.config.sessionSecret, secure, wallCookie);
  return {
    ...given,
    passwords,
    cookie,
    wallCookie,
    xsrf,
    eventStreams: createEventStreams(given.draining),
    sessions: createSessions(given.connection.db, xsrf, cookie, wallCookie),
    layerFiles: layerFiles(given.connection.db, given.storage),
    limits: createLimits(limits, given.connection.db, given.log),
  };
}
