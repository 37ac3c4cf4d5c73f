import {
  formatDate,
  formatInstant,
  formatMoney,
  formatNumber,
  formatOdds,
  formatPercent,
  formatSigma,
} from '@/components/ui/number-format';

describe('formatMoney', () => {
  it.each([
    ['1204.5', {}, '1,204.50'],
    ['-593.28', {}, '−593.28'],
    ['318.35', { sign: true }, '+318.35'],
    ['318.35', { sign: true, currency: 'USD' }, '+318.35 USD'],
    ['0.123400', {}, '0.1234'],
    ['12345678901234567890.01', {}, '12,345,678,901,234,567,890.01'],
    ['0.005', { places: 2 }, '0.01'],
    [-438.9, { sign: true }, '−438.90'],
    [1234567, { places: 0 }, '1,234,567'],
  ])('writes %p with %p as %p', (value, options, text) => {
    expect(formatMoney(value, options)).toBe(text);
  });

  it.each([0, -0, '0.00', '-0.00', -0.001])('puts no sign on %p, which rounds to nothing', (value) => {
    expect(formatMoney(value, { sign: true, places: 2 })).toBe('0.00');
  });

  it.each([NaN, Infinity, '', 'n/a'])('writes a dash for %p', (value) => {
    expect(formatMoney(value)).toBe('–');
  });
});

describe('formatNumber', () => {
  it.each([
    [12480, undefined, '12,480'],
    [-0.25, undefined, '−0.25'],
    [2, 2, '2.00'],
    [1 / 3, undefined, '0.3333'],
  ])('writes %p with %p places as %p', (value, places, text) => {
    expect(formatNumber(value, places)).toBe(text);
  });
});

describe('formatPercent', () => {
  it.each([
    [0.0172, 2, {}, '1.72%'],
    [0.4, 0, {}, '40%'],
    [-0.031, 1, { sign: true }, '−3.1%'],
    [0.031, 1, { sign: true }, '+3.1%'],
    [NaN, 0, {}, '–'],
  ])('writes %p with %p places and %p as %p', (fraction, places, options, text) => {
    expect(formatPercent(fraction, places, options)).toBe(text);
  });
});

describe('formatOdds', () => {
  it.each([
    [0, '<1%'],
    [0.0099, '<1%'],
    [0.01, '1%'],
    [0.274, '27%'],
    [0.99, '99%'],
    [0.9901, '>99%'],
    [1, '>99%'],
    [NaN, '–'],
  ])('writes %p as %p', (probability, text) => {
    expect(formatOdds(probability)).toBe(text);
  });
});

describe('formatSigma', () => {
  it('always tells the direction, with a true minus', () => {
    expect([0.95, -1.4, 0].map((sigmas) => formatSigma(sigmas))).toEqual(['+0.95σ', '−1.40σ', '0.00σ']);
  });
});

describe('formatDate', () => {
  it.each([
    ['short', '9 Dec'],
    ['weekday', 'Wed 9 Dec'],
    ['withYear', '9 Dec 2026'],
    ['long', '9 December 2026'],
    ['full', 'Wednesday 9 December 2026'],
  ] as const)('has the style %s', (style, text) => {
    expect(formatDate('2026-12-09', style)).toBe(text);
  });

  it('gives back what is no date', () => {
    expect([formatDate('tomorrow'), formatDate('2026-13-09'), formatDate('')]).toEqual(['tomorrow', '2026-13-09', '']);
  });
});

describe('formatInstant', () => {
  it('reads the clock of the time zone, over midnight and daylight saving', () => {
    expect(formatInstant('2026-12-09T21:00:00.000Z', 'America/New_York')).toBe('9 Dec, 16:00');
    expect(formatInstant('2026-12-10T02:30:00.000Z', 'America/New_York', 'withYear')).toBe('9 Dec 2026, 21:30');
    expect(formatInstant('2026-07-01T13:05:00.000Z', 'America/New_York', 'time')).toBe('09:05');
    expect(formatInstant('2026-12-09T23:30:00.000Z', 'Europe/Berlin', 'date')).toBe('10 Dec');
  });

  it('gives back what is no instant', () => {
    expect(formatInstant('soon', 'UTC')).toBe('soon');
  });
});
