import { execFile } from 'node:child_process';
import { X509Certificate } from 'node:crypto';
import { createServer, request } from 'node:https';
import { mkdtemp, rm, stat } from 'node:fs/promises';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ownCertificate, ownNames } from './own-certificate';

describe('the certificate of this machine', () => {
  let dir: string;
  beforeAll(async () => void (dir = await mkdtemp(join(tmpdir(), 'oriel-tls-'))));
  afterAll(() => rm(dir, { recursive: true, force: true }));

  it('is made for every name and address of this machine, and is no authority', async () => {
    const { cert } = await ownCertificate(dir);
    const parsed = new X509Certificate(cert);
    expect(parsed.checkHost('localhost')).toBe('localhost');
    expect(parsed.checkIP('127.0.0.1')).toBe('127.0.0.1');
    expect(ownNames().length).toBeGreaterThanOrEqual(5);
    expect(parsed.ca).toBe(false);
    // openssl's own reading of it (outside check): one set of constraints, valid 397 days at most.
    const { stdout } = await promisify(execFile)('openssl', ['x509', '-in', join(dir, 'certificate.pem'), '-noout', '-text']);
    expect(stdout.match(/CA:(TRUE|FALSE)/g)).toHaveLength(1);
    const days = (Date.parse(parsed.validTo) - Date.parse(parsed.validFrom)) / 86_400_000;
    expect(days).toBeLessThanOrEqual(398);
  });

  it('security: keeps its key to its owner', async () => {
    await ownCertificate(dir);
    expect((await stat(join(dir, 'key.pem'))).mode & 0o777).toBe(0o600);
  });

  it('is kept, and made anew when the machine has a new address', async () => {
    const first = await ownCertificate(dir);
    expect((await ownCertificate(dir)).cert.equals(first.cert)).toBe(true);
    const moved = await ownCertificate(dir, [...ownNames(), 'IP:192.0.2.77']);
    expect(new X509Certificate(moved.cert).checkIP('192.0.2.77')).toBe('192.0.2.77');
  });

  it('serves: a client that trusts it alone connects', async () => {
    const certificate = await ownCertificate(dir);
    const server = createServer(certificate, (_request, response) => response.end('seen'));
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const { port } = server.address() as AddressInfo;
    const answer = await new Promise<string>((resolve, reject) => {
      request({ host: 'localhost', port, ca: certificate.cert, family: 4 }, (response) => {
        response.setEncoding('utf8').on('data', resolve);
      })
        .on('error', reject)
        .end();
    });
    expect(answer).toBe('seen');
    server.close();
  });

  it('says what to do where openssl is missing', async () => {
    const path = process.env['PATH'];
    process.env['PATH'] = '/nowhere';
    try {
      await expect(ownCertificate(join(dir, 'other'))).rejects.toThrow(/apt-get install openssl/);
    } finally {
      process.env['PATH'] = path;
    }
  });
});
