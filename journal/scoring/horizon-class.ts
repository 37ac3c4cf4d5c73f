import { DomainError } from '@/journal/errors/domain-error';

/** Lengths of a hold that are judged apart, because costs, methods and risks differ; shortest first. */
export const horizonClasses = ['under-1', 'expiry-day', '1-5', '6-30', 'longer'] as const;
export type HorizonClass = (typeof horizonClasses)[number];

/**
 * The class of a planned hold.
 * @param holdingSessions sessions of the hold on the session clock, 0 or more; parts of a session are rounded away from 1 on.
 * @param endsAtExpiry whether a hold within one session runs to the options' expiry.
 * @throws {DomainError} `sessions-invalid`.
 * @see Common practice.
 */
export function horizonClass({
  holdingSessions,
  endsAtExpiry,
}: {
  holdingSessions: number;
  endsAtExpiry: boolean;
}): HorizonClass {
  if (!(holdingSessions >= 0)) throw new DomainError('sessions-invalid', { holdingSessions });
  if (holdingSessions < 1) return endsAtExpiry ? 'expiry-day' : 'under-1';
  const sessions = Math.round(holdingSessions);
  if (sessions <= 5) return '1-5';
  return sessions <= 30 ? '6-30' : 'longer';
}
