import { destination, pino, type Logger } from 'pino';
import { plainError } from './log-requests';

/**
 * The server's log, to its standard output. Each line is written at once: pino's own way keeps lines back and writes them as the process
 * exits, and waits there for ever once whoever reads them is gone.
 */
export const openLog = (level: string): Logger => pino({ level, serializers: { err: plainError } }, destination({ sync: true }));
