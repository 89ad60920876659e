import { clockReading } from './moments';

describe('clockReading', () => {
  it('is what the clock of this place shows, written as if it were UTC', () => {
    const moment = new Date(2024, 4, 31, 23, 30, 15);
    expect(clockReading(moment)).toBe('2024-05-31T23:30:15.000Z');
  });
});
