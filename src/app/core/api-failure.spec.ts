import { ApiFailure } from './api-failure';

describe('a failed request', () => {
  const failed = (status: number) => new ApiFailure(status, { code: 'some', message: '', remedy: '', reference: '' });

  it('may pass later where time, the network or signing in can help (RFC 9110, 15.5 and 15.6; RFC 6585, 4: read)', () => {
    for (const status of [0, 401, 408, 409, 429, 500, 503]) expect(failed(status).mayPass).toBe(true);
  });

  it('will not pass where what was sent is refused for what it is', () => {
    for (const status of [400, 403, 404, 413, 415, 422]) expect(failed(status).mayPass).toBe(false);
  });
});
