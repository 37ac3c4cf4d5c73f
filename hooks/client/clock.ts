/** Where the client gets the time from: passed in, so that any screen can be shown at any time. */
export interface Clock {
  /** ISO 8601 in UTC with milliseconds. */
  readonly now: () => string;
}

export const systemClock: Clock = { now: () => new Date().toISOString() };
