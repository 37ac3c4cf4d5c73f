/** The one source of time: injected everywhere, so that any moment can be tested. */
export interface Clock {
  readonly now: () => Date;
}

export const systemClock: Clock = { now: () => new Date() };
