import { type ActualExit, type ExitRule, type ExitRules } from '@/journal/process/exit-rule';
import { exitTag } from '@/journal/process/exit-tag';
import { exitCost, exitDelay } from '@/journal/process/exit-cost';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';

const refusal = (code: string) => expect.objectContaining({ code });

// Worked outside this project: short 2 strangles at 1.40, sealed stop 2.80, closed 4.34: loss 588.00, at the stop 280.00, cost 308.00.
const stop: ExitRule = { basis: 'net-price', level: '2.80', heldWhen: 'at-or-above', startLevel: '1.40' };
const target: ExitRule = { basis: 'net-price', level: '0.70', heldWhen: 'at-or-below', startLevel: '1.40' };
const rules: ExitRules = {
  target,
  stop,
  time: { from: '2026-12-16T14:30:00.000Z', to: '2026-12-16T21:00:00.000Z' },
  event: { from: '2026-12-14T14:30:00.000Z', to: '2026-12-14T21:00:00.000Z' },
  expiryOpensAt: '2026-12-18T14:30:00.000Z',
};
const exit = (rest: Partial<ActualExit>): ActualExit => ({
  kind: 'buy',
  at: '2026-12-11T18:00:00.000Z',
  underlyingPrice: null,
  netPrice: '1.50',
  ...rest,
});
const planned = { at: '2026-12-16T18:00:00.000Z' };

describe('a stop that was not followed', () => {
  it('is tagged unplanned and cost 308.00: 588.00 were lost, 280.00 at the stop', () => {
    expect(exitTag(exit({ netPrice: '4.34' }), rules)).toBe('unplanned');
    expect(exitCost({ rulePrice: '2.80', exitPrice: '4.34', entryPrice: '1.40', signedShares: '-200' })).toEqual({
      profitByRule: '-280',
      profit: '-588',
      cost: '308',
    });
  });

  it('stays unplanned in the planned hour of leaving', () => {
    expect(exitTag(exit({ netPrice: '4.34', ...planned }), rules)).toBe('unplanned');
  });
});

describe('exitTag', () => {
  it.each<[string, Partial<ActualExit>]>([
    ['stop', { netPrice: '2.80' }],
    ['stop', { netPrice: '2.94' }], // a tenth of the 1.40 from start to stop
    ['unplanned', { netPrice: '2.95' }],
    ['target', { netPrice: '0.70' }],
    ['target', { netPrice: '0.05' }],
    ['unplanned', { netPrice: '0.71' }],
    ['event', { at: '2026-12-14T18:00:00.000Z' }],
    ['time', planned],
    ['time', { at: '2026-12-16T21:00:00.000Z' }],
    ['unplanned', { at: '2026-12-16T21:00:00.001Z' }],
    ['time', { ...planned, netPrice: null }],
    ['expiry', { kind: 'expiry', at: '2026-12-18T21:00:00.000Z' }],
    ['expiry', { kind: 'assignment', at: '2026-12-18T21:00:00.000Z' }],
    ['unplanned', { kind: 'assignment', at: '2026-12-15T21:00:00.000Z' }],
  ])('says %s of %p', (tag, rest) => {
    expect(exitTag(exit(rest), rules)).toBe(tag);
  });

  it('knows no rule that the plan does not have', () => {
    const none = { ...rules, target: null, stop: null, time: null, event: null };
    for (const netPrice of ['0.05', '9', '1.4'])
      expect(exitTag(exit({ netPrice, ...planned }), none)).toBe('unplanned');
  });

  it('reads levels of the underlying from the price of the underlying', () => {
    const below: ExitRule = { basis: 'underlying', level: '97', heldWhen: 'at-or-below', startLevel: '100' };
    expect(exitTag(exit({ underlyingPrice: '96.90' }), { ...rules, stop: below })).toBe('stop');
    expect(exitTag(exit({ underlyingPrice: '97.10' }), { ...rules, stop: below })).toBe('unplanned');
    expect(exitTag(exit({ underlyingPrice: '96.90' }), { ...rules, stop: below }, { stopTolerance: 0 })).toBe(
      'unplanned',
    );
  });

  it.each([-0.1, NaN, Infinity])('refuses a tolerance of %p', (stopTolerance) => {
    expect(() => exitTag(exit({}), rules, { stopTolerance })).toThrow(refusal('stop-tolerance-invalid'));
  });

  it('refuses a level that its start already meets, and a time that is none', () => {
    expect(() => exitTag(exit({}), { ...rules, stop: { ...stop, startLevel: '2.80' } })).toThrow(
      refusal('exit-rule-invalid'),
    );
    expect(() => exitTag(exit({ at: 'noon' }), rules)).toThrow(refusal('instant-invalid'));
  });
});

describe('exitDelay', () => {
  const question = { calendar: usOptionsCalendar, settings: { overnightShare: 0.3 } };

  it('counts the sessions from the moment the rule held', () => {
    const delay = exitDelay({
      ...question,
      ruleHeldAt: '2026-12-10T21:00:00.000Z',
      exitAt: '2026-12-14T21:00:00.000Z',
    });
    expect(delay).toBe(2);
  });

  it('is 0 for an exit that came first', () => {
    const [ruleHeldAt, exitAt] = ['2026-12-14T21:00:00.000Z', '2026-12-10T21:00:00.000Z'];
    expect(exitDelay({ ...question, ruleHeldAt, exitAt })).toBe(0);
  });
});

describe('exitCost', () => {
  it('is negative when leaving the rule paid', () => {
    expect(exitCost({ rulePrice: '2.80', exitPrice: '2.00', entryPrice: '1.40', signedShares: '-200' }).cost).toBe(
      '-160',
    );
  });

  it('refuses a position of nothing', () => {
    expect(() => exitCost({ rulePrice: '1', exitPrice: '1', entryPrice: '1', signedShares: '0' })).toThrow(
      refusal('quantity-zero'),
    );
  });
});
