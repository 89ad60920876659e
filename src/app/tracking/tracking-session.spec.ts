import type { FaceModels } from './face-models';
import type { FromTracker, TrackerSettings } from './tracking-messages';
import { TrackingSession } from './tracking-session';

/** A camera's frame that can be copied only once `copied` is called. */
class FakeFrame {
  readonly format = 'I420';
  readonly timestamp = 33_000;
  closed = false;
  copied = (): void => undefined;
  allocationSize = () => 6;
  copyTo = () => new Promise<never>((_, reject) => (this.copied = () => reject(new Error('cut off'))));
  close = () => (this.closed = true);
}

/** The camera's stream, as its frames are given. */
function streamOf() {
  let giver: ReadableStreamDefaultController<VideoFrame>;
  let cancelled = false;
  const frames = new ReadableStream<VideoFrame>({ start: (given) => void (giver = given), cancel: () => void (cancelled = true) }, { highWaterMark: 0 });
  return { frames, give: (frame: FakeFrame) => giver.enqueue(frame as unknown as VideoFrame), cancelled: () => cancelled };
}

const settings = { assetsUrl: '/' } as TrackerSettings;
const turn = () => new Promise((resolve) => setTimeout(resolve));

describe('a tracking session', () => {
  const said: FromTracker['type'][] = [];
  const session = async () => {
    said.length = 0;
    const models = { tensors: () => 0, dispose: () => undefined } as unknown as FaceModels;
    const made = new TrackingSession(({ type }) => said.push(type), () => Promise.resolve(models));
    await made.hear({ type: 'start', settings });
    return made;
  };

  it('has closed the frame in its hands before it says that it has stopped', async () => {
    const tracking = await session();
    const { frames, give, cancelled } = streamOf();
    const frame = new FakeFrame();
    void tracking.hear({ type: 'stream', frames });
    give(frame);
    await turn();
    const stopped = tracking.hear({ type: 'stop' });
    await turn();
    expect([said, frame.closed, cancelled()]).toEqual([['ready'], false, true]);
    frame.copied();
    await stopped;
    expect([said.includes('stopped'), frame.closed]).toEqual([true, true]);
  });

  it('takes up no stream once it was stopped', async () => {
    const tracking = await session();
    const { frames, cancelled } = streamOf();
    await tracking.hear({ type: 'stop' });
    await tracking.hear({ type: 'stream', frames });
    expect(cancelled()).toBe(true);
  });
});
