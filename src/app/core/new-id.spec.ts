import * as z from 'zod';
import { newId } from './new-id';

describe('newId', () => {
  it('makes UUIDs of version 4, none twice (checked by zod)', () => {
    const made = Array.from({ length: 1000 }, newId);
    for (const id of made) expect(z.uuidv4().safeParse(id).success, id).toBe(true);
    expect(new Set(made).size).toBe(made.length);
  });
});
