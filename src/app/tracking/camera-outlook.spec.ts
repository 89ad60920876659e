import { cameraOutlook } from './camera-outlook';

const browser = (state: string | null, kinds: readonly string[]) =>
  ({
    permissions: { query: () => (state ? Promise.resolve({ state }) : Promise.reject(new TypeError('not a name'))) },
    mediaDevices: { enumerateDevices: () => Promise.resolve(kinds.map((kind) => ({ kind }))) },
  }) as unknown as Navigator;

it.each([
  ['refused', browser('denied', ['videoinput'])],
  ['no-camera', browser('prompt', ['audioinput'])],
  ['no-camera', browser(null, [])],
  ['unsupported', {}],
  [null, browser('prompt', ['videoinput'])],
  [null, browser(null, ['audioinput', 'videoinput'])],
] as const)('is known before the camera is asked for: %s', async (outlook, navigator) => {
  expect(await cameraOutlook(navigator)).toBe(outlook);
});
