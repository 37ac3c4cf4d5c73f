import { horizonClass } from '@/journal/scoring/horizon-class';

describe('the class of a hold', () => {
  it.each([
    [0.0538, false, 'under-1'],
    [0.3769, true, 'expiry-day'],
    [1, true, '1-5'],
    [5.4, false, '1-5'],
    [5.5, false, '6-30'],
    [30.4, false, '6-30'],
    [31, false, 'longer'],
  ] as const)('of %p sessions, to expiry %p, is %p', (holdingSessions, endsAtExpiry, expected) => {
    expect(horizonClass({ holdingSessions, endsAtExpiry })).toBe(expected);
  });

  it.each([-1, NaN])('throws sessions-invalid for %p', (holdingSessions) => {
    expect(() => horizonClass({ holdingSessions, endsAtExpiry: false })).toThrow(
      expect.objectContaining({ code: 'sessions-invalid' }),
    );
  });
});
