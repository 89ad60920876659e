import type { Request, Response } from 'express';
import { wallOfScreen } from '../http/access';
import { notPaired } from '../http/failure';
import type { Parts } from '../parts';
import { wallTopic } from './wall-changes';

/** Tells a screen of changes for as long as its credential holds. When in doubt the line ends: the screen asks again and learns the rest. */
export function wallEvents({ connection: { db }, changes, eventStreams, wallCookie, log }: Parts) {
  return (wallId: string, request: Request, response: Response): void => {
    const credential = wallCookie.read(request);
    if (!credential) throw notPaired();
    const isPaired = async () => (await wallOfScreen(db, credential))?.id === wallId;

    const stream = eventStreams.open(response, () => unsubscribe());
    const tell = () =>
      void isPaired().then(
        (paired) => (paired ? stream.send('changed') : stream.end()),
        (error: unknown) => {
          log.warn({ err: error }, 'a wall could not be told of a change');
          stream.end();
        },
      );
    const unsubscribe = changes.subscribe(wallTopic(wallId), tell);
    // What changed before it listened.
    tell();
  };
}
