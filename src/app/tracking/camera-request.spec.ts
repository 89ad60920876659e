import { requestCamera } from './camera-request';

const camerasThatFail = (name: string): MediaDevices =>
  ({ getUserMedia: () => Promise.reject(new DOMException('', name)) }) as unknown as MediaDevices;

describe('requestCamera', () => {
  it.each([
    ['NotAllowedError', 'refused'],
    ['SecurityError', 'refused'],
    ['NotFoundError', 'no-camera'],
    ['OverconstrainedError', 'no-camera'],
    ['NotReadableError', 'camera-busy'],
    ['AbortError', 'camera-busy'],
  ])('answers %s with %s (names: W3C Media Capture and Streams)', async (name, why) => {
    expect(await requestCamera(camerasThatFail(name))).toEqual({ given: false, why });
  });

  it('knows a page that can have no camera', async () => {
    expect(await requestCamera(undefined)).toEqual({ given: false, why: 'unsupported' });
  });

  it('gives the stream it got', async () => {
    const stream = {} as MediaStream;
    const cameras = { getUserMedia: () => Promise.resolve(stream) } as unknown as MediaDevices;
    expect(await requestCamera(cameras)).toEqual({ given: true, stream });
  });
});
