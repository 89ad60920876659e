import { clockReading } from './moments';

describe('clockReading', () => {
  afterEach(() => vi.restoreAllMocks());

  it('is what the clock of this place shows, written as if it were UTC: two hours ahead of it, half past nine is half past eleven', () => {
    vi.spyOn(Date.prototype, 'getTimezoneOffset').mockReturnValue(-120);
    expect(clockReading(new Date('2024-05-31T21:30:15Z'))).toBe('2024-05-31T23:30:15.000Z');
  });
});
