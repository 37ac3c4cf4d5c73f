import { uuidv7 } from 'uuidv7';

/** Makes identifiers (UUIDv7: they sort by time, so indexes stay compact). */
export interface Ids {
  readonly next: () => string;
}

export const systemIds: Ids = { next: uuidv7 };
