import { sql } from 'kysely';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Password } from '@oriel/shared/contracts/fields';
import { createTestDatabase, type TestDatabase } from '../testing/test-database';
import { hashOfToken, makeToken } from '../http/secret-token';
import { createPasswords } from './passwords';

describe('passwords and mailed secrets', () => {
  const passwords = createPasswords(4);
  let database: TestDatabase;
  beforeAll(async () => {
    database = await createTestDatabase();
    await sql`create extension pgcrypto`.execute(database.connection.db);
  });
  afterAll(() => database.drop());

  it.each(['plaster ink brass', 'Mörtel, Tinte & Messing', 'a'.repeat(72), '🪟🪟🪟🪟🪟🪟🪟🪟🪟🪟'])(
    'hashes %s to what another bcrypt makes of it (PostgreSQL pgcrypto; computed)',
    async (password) => {
      const hash = await passwords.hash(password);
      // pgcrypto knows the scheme by its older name 2a; for passwords of at most 72 bytes the two are the same.
      const known = hash.replace(/^\$2b\$/, '$2a$');
      const { rows } = await sql<{ theirs: string }>`select crypt(${password}, ${known}) as theirs`.execute(database.connection.db);
      expect(rows[0].theirs).toBe(known);
      expect(await passwords.matches(password, hash)).toBe(true);
      expect(await passwords.matches(`${password.slice(0, -1)}x`, hash)).toBe(false);
    },
  );

  it('costs 2^12 rounds in earnest', async () => {
    expect(await createPasswords().hash('plaster ink brass')).toMatch(/^\$2b\$12\$/);
  });

  it('security: a longer password is refused and never cut to its first 72 bytes', async () => {
    const longest = 'a'.repeat(72);
    const hash = await passwords.hash(longest);
    expect(await passwords.matches(`${longest}b`, hash)).toBe(false);
    expect(Password.safeParse(longest).success).toBe(true);
    expect(Password.safeParse(`${longest}b`).success).toBe(false);
    expect(Password.safeParse('é'.repeat(37)).success).toBe(false);
  });

  it('security: nothing matches where there is no hash', async () => {
    expect(await passwords.matches('', null)).toBe(false);
    expect(await passwords.matches('plaster ink brass', null)).toBe(false);
  });

  it('security: a mailed secret has 256 random bits and is kept as its SHA-256 (PostgreSQL sha256; computed)', async () => {
    const { token, hash } = makeToken();
    expect(Buffer.from(token, 'base64url')).toHaveLength(32);
    expect(hash.equals(hashOfToken(token))).toBe(true);
    const { rows } = await sql<{ theirs: Buffer }>`select sha256(${Buffer.from(token)}::bytea) as theirs`.execute(database.connection.db);
    expect(rows[0].theirs.equals(hash)).toBe(true);
    expect(new Set(Array.from({ length: 1000 }, () => makeToken().token)).size).toBe(1000);
  });
});
