/** What time it is. Use cases that depend on the time take one, so that tests choose it. */
export interface Clock {
  now(): Date;
}

/** The machine's clock. */
export const systemClock: Clock = { now: () => new Date() };

/** A clock that stands still, for tests. */
export function stoppedClock(at: Date | string): Clock {
  return { now: () => new Date(at) };
}
