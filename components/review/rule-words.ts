import { type RuleAction, type RuleFollowing } from '@/shared/reviews/weekly-review-endpoints';

export const actionWords: Record<RuleAction, string> = { keep: 'Keep', change: 'Change', drop: 'Drop' };
export const followedWords: Record<RuleFollowing, string> = { yes: 'Yes', partly: 'Partly', no: 'No' };
