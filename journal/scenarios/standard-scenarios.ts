import { type NamedScenario, unchanged } from '@/journal/scenarios/scenario';

const sigmas = (count: number) => ({ kind: 'sigmas' as const, sigmas: count });
const relative = (percent: number) => ({ kind: 'relative' as const, percent });

/**
 * What to look at before a trade: moves either way, volatility with and against them, and time alone.
 * @param sessionsElapsed when it is looked at, 0 to the sessions to expiry.
 * @see common practice; volatility that rises as prices fall: Black (1976), Christie (1982).
 */
export function standardScenarios(sessionsElapsed: number): NamedScenario[] {
  const at = { ...unchanged, sessionsElapsed };
  return [
    { ...at, name: 'nothing moves' },
    { ...at, name: 'up 1 sigma', move: sigmas(1) },
    { ...at, name: 'down 1 sigma', move: sigmas(-1) },
    { ...at, name: 'up 2 sigmas, volatility down a tenth', move: sigmas(2), volatility: relative(-10) },
    { ...at, name: 'down 2 sigmas, volatility up a quarter', move: sigmas(-2), volatility: relative(25) },
    { ...at, name: 'volatility up a quarter', volatility: relative(25) },
    { ...at, name: 'volatility down a quarter', volatility: relative(-25) },
  ];
}

/**
 * An event that is bought over: it passes without a move, or moves the price by what was priced in for it.
 * @param event.deviation of the log price on the event, above 0; `sessionsElapsed` when it is looked at, after the event.
 * @see common practice; event variance: Patell and Wolfson (1979).
 */
export function eventScenarios(event: {
  readonly deviation: number;
  readonly sessionsElapsed: number;
}): NamedScenario[] {
  const { deviation, sessionsElapsed } = event;
  const past = { ...unchanged, sessionsElapsed, isEventPast: true };
  const move = (deviations: number) => ({
    kind: 'percent' as const,
    percent: 100 * Math.expm1(deviations * deviation),
  });
  return [
    { ...past, name: 'event passes without a move' },
    { ...past, name: 'event moves up by what was priced in', move: move(1) },
    { ...past, name: 'event moves down by what was priced in', move: move(-1) },
    { ...past, name: 'event moves up by twice that', move: move(2) },
    { ...past, name: 'event moves down by twice that', move: move(-2) },
  ];
}
