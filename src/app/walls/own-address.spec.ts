import { addressWarnings, isOwnAddress } from './own-address';

describe('an address at which another machine is to open Oriel', () => {
  it.each(['http://localhost:4300', 'https://localhost', 'http://oriel.localhost:80', 'http://127.0.0.1:4300', 'http://127.3.2.1', 'http://[::1]:4300'])('%s is this machine’s own', (origin) => {
    expect(isOwnAddress(origin)).toBe(true);
    expect(addressWarnings(origin).join(' ')).toContain('PUBLIC_URL=');
  });

  it.each(['https://oriel.local:8443', 'https://192.168.1.20:4300', 'https://localhost.example'])('%s will do', (origin) => {
    expect(addressWarnings(origin)).toEqual([]);
  });

  it('plain http elsewhere has no camera', () => {
    expect(addressWarnings('http://192.168.1.20:4300')[0]).toContain('not follow');
  });
});
