import 'express-session';

declare module 'express-session' {
  interface SessionData {
    accountId: string;
    /** Milliseconds since the epoch. */
    signedInAt: number;
    renewedAt: number;
  }
}
