import { type DomainError } from '@/journal/errors/domain-error';
import { type PlanProblem } from '@/shared/entries/plan-problem';

/** What a person is told when the engine refuses a plan. */
export function planProblemOf({ code, details }: DomainError): PlanProblem {
  const leg = typeof details.legIndex === 'number' ? details.legIndex : 0;
  switch (code) {
    case 'legs-of-several-expiries':
      return {
        field: `legs.${leg}.expirySessionDate`,
        message: `Leg ${leg + 1}: all legs of a plan need one expiry. Plan the other expiry apart.`,
      };
    case 'expiry-in-the-past':
      return {
        field: 'legs.0.expirySessionDate',
        message: 'The expiry is not after the price of the underlying. Choose a later expiry.',
      };
    case 'holding-beyond-expiry':
      return {
        field: 'holdingSessions',
        message: `The hold is longer than the ${Number(Number(details.toExpiry).toFixed(2))} sessions to expiry. Shorten it, or hold to expiry.`,
      };
    case 'holding-not-positive':
      return { field: 'holdingSessions', message: 'The hold must be above 0 sessions.' };
    case 'volatility-order':
      return {
        field: 'volatility.source',
        message: 'The volatility must be above 0. With closes that never change there is nothing to price: type it.',
      };
    case 'target-and-stop-on-one-side':
      return {
        field: 'stopPrice',
        message: 'Target and stop lie on one side of the price. Put one above it and one below, or leave one empty.',
      };
    case 'strike-not-positive':
      return { field: `legs.${leg}.strikePrice`, message: `Leg ${leg + 1}: the strike must be above 0.` };
    default:
      return { field: '', message: `The engine cannot work with this plan (${code}). Check its numbers.` };
  }
}
