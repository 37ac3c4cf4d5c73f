import { breakEvenMoves } from '@/journal/forecast/break-even-moves';
import { oddsOfProfit } from '@/journal/forecast/describe-distribution';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { planHorizon } from '@/journal/forecast/plan-horizon';
import { lawAt, planModel, profitAtExit } from '@/journal/forecast/plan-model';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { bullPut, longCall } from '@/tests/journal/forecast/plan-examples';

const modelOf = (input: ForecastInput) => planModel(input, planHorizon(input, usOptionsCalendar));

describe('what must be true', () => {
  it('is a rise of 3.2065% or 0.665 sigmas by expiry for the long call: 102 + 1.20 and the fee', () => {
    const [atExpiry] = breakEvenMoves(modelOf(longCall));
    const [range] = atExpiry?.profitable ?? [];
    expect(atExpiry).toMatchObject({ horizon: 'expiry', bySessionDate: '2026-12-23', sessions: 10 });
    expect(range?.from?.price).toBeCloseTo(103.2065, 9);
    expect(range?.from?.percent).toBeCloseTo(3.2065, 9);
    expect(range?.from?.sigmas).toBeCloseTo(Math.log(1.032065) / (0.015 * Math.sqrt(10)), 9);
    expect(range?.to).toBeNull();
    expect(range?.probability).toBeCloseTo(0.245, 3);
  });

  it('has odds that sum to those of profit at either horizon', () => {
    const model = modelOf({ ...bullPut, holding: { kind: 'sessions', sessions: 4 } });
    const moves = breakEvenMoves(model);
    expect(moves.map(({ horizon }) => horizon)).toEqual(['exit', 'expiry']);
    for (const { horizon, profitable } of moves) {
      const sum = profitable.reduce((total, { probability }) => total + probability, 0);
      expect(sum).toBeCloseTo(oddsOfProfit(lawAt(model, horizon, 0.015, model.input.drift)), 11);
    }
  });

  it('breaks even at its ends', () => {
    const model = modelOf({ ...bullPut, holding: { kind: 'sessions', sessions: 4 } });
    const [atExit] = breakEvenMoves(model);
    const from = atExit?.profitable[0]?.from;
    expect(profitAtExit(model)(from?.price ?? 0)).toBeCloseTo(0, 8);
    expect(atExit?.sessions).toBe(4);
  });

  it('is nothing where no price makes a profit', () => {
    const dear = { ...bullPut, legs: bullPut.legs.map((leg) => ({ ...leg, premium: '1.00' })) };
    expect(breakEvenMoves(modelOf(dear))[0]?.profitable).toEqual([]);
  });
});
