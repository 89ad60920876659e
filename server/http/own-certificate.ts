import { spawn } from 'node:child_process';
import { X509Certificate } from 'node:crypto';
import { chmod, mkdir, mkdtemp, readFile, rename, rm } from 'node:fs/promises';
import { hostname, networkInterfaces } from 'node:os';
import { join } from 'node:path';

export interface Certificate {
  readonly key: Buffer;
  readonly cert: Buffer;
}

/** Browsers take no server certificate valid for longer (CA/Browser Forum baseline requirements, 6.3.2). */
const validDays = 397;
const renewBeforeMs = 30 * 24 * 3_600_000;

/** The names and addresses this machine answers to, as subjectAltName writes them (RFC 5280, 4.2.1.6). */
export function ownNames(): string[] {
  const addresses = Object.values(networkInterfaces()).flatMap((cards) => cards ?? []);
  const usable = addresses.filter(({ address, scopeid }) => !scopeid && !address.includes('%')).map(({ address }) => `IP:${address}`);
  return [...new Set(['DNS:localhost', `DNS:${hostname()}`, `DNS:${hostname()}.local`, 'IP:127.0.0.1', 'IP:::1', ...usable])];
}

function covers(cert: X509Certificate, name: string): boolean {
  const [kind, value] = [name.slice(0, name.indexOf(':')), name.slice(name.indexOf(':') + 1)];
  return (kind === 'DNS' ? cert.checkHost(value) : cert.checkIP(value)) !== undefined;
}

async function kept(dir: string, names: readonly string[]): Promise<Certificate | null> {
  try {
    const [key, cert] = await Promise.all([readFile(join(dir, 'key.pem')), readFile(join(dir, 'certificate.pem'))]);
    const parsed = new X509Certificate(cert);
    const fresh = Date.parse(parsed.validTo) - Date.now() > renewBeforeMs;
    return fresh && names.every((name) => covers(parsed, name)) ? { key, cert } : null;
  } catch {
    return null;
  }
}

const run = (command: string, args: readonly string[]) =>
  new Promise<void>((resolve, reject) => {
    const child = spawn(command, args, { stdio: ['ignore', 'ignore', 'pipe'] });
    let said = '';
    child.stderr.on('data', (chunk: Buffer) => (said += chunk.toString()));
    child.on('error', () =>
      reject(new Error('HTTPS=self needs the program openssl, which is not installed. Install it (Debian: apt-get install openssl), or set HTTPS=off and put a reverse proxy in front.')),
    );
    child.on('close', (code) => (code === 0 ? resolve() : reject(new Error(`openssl could not make a certificate: ${said.trim()}`))));
  });

/**
 * The certificate of this machine, made by itself with openssl: P-256, for all of its names and addresses. Kept in the folder (the key for
 * its owner's eyes alone) and made anew when it nears its end or the machine has a new address.
 * @throws Error that says what to do when openssl is missing or fails.
 */
export async function ownCertificate(dir: string, names: readonly string[] = ownNames()): Promise<Certificate> {
  await mkdir(dir, { recursive: true, mode: 0o700 });
  const found = await kept(dir, names);
  if (found) return found;

  const work = await mkdtemp(join(dir, 'making-'));
  try {
    const [key, cert] = [join(work, 'key.pem'), join(work, 'certificate.pem')];
    await run('openssl', [
      ...['req', '-x509', '-newkey', 'ec', '-pkeyopt', 'ec_paramgen_curve:prime256v1', '-nodes', '-sha256', '-days', String(validDays)],
      ...['-subj', '/CN=Oriel on this machine', '-addext', `subjectAltName=${names.join(',')}`, '-addext', 'extendedKeyUsage=serverAuth'],
      // So that whoever trusts it trusts this server and not a maker of further certificates.
      ...['-addext', 'basicConstraints=critical,CA:FALSE'],
      ...['-keyout', key, '-out', cert],
    ]);
    await chmod(key, 0o600);
    await rename(key, join(dir, 'key.pem'));
    await rename(cert, join(dir, 'certificate.pem'));
  } finally {
    await rm(work, { recursive: true, force: true });
  }
  return { key: await readFile(join(dir, 'key.pem')), cert: await readFile(join(dir, 'certificate.pem')) };
}
