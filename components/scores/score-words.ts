import { type HorizonClass } from '@/journal/scoring/horizon-class';
import { type CutKind } from '@/shared/scores/scores';

export const horizonWords: Readonly<Record<HorizonClass, string>> = {
  'under-1': 'Under a session',
  'expiry-day': 'To expiry, same day',
  '1-5': '1 to 5 sessions',
  '6-30': '6 to 30 sessions',
  longer: 'Over 30 sessions',
};

export const cutWords: Readonly<Record<CutKind, string>> = {
  structure: 'Structure',
  underlying: 'Underlying',
  horizon: 'Horizon',
  tag: 'Tag',
};

/** "12 entries", "1 entry". */
export const entriesWord = (count: number) => `${count} ${count === 1 ? 'entry' : 'entries'}`;

/** "Bull put". */
export const capital = (text: string) => text.slice(0, 1).toUpperCase() + text.slice(1);

/** What a p value says, without pretending to more than it can. */
export function chanceWords(pValue: number): string {
  const text = pValue < 0.001 ? 'less than 0.1%' : `${(pValue * 100).toFixed(pValue < 0.1 ? 1 : 0)}%`;
  return `chance alone is this uneven ${text} of the time`;
}
