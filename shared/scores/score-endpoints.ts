import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { noInput } from '@/shared/contract/no-input';
import { roles } from '@/shared/contract/roles';
import { scoreFilterSchema } from '@/shared/scores/score-filter';
import { scoresSchema } from '@/shared/scores/scores';

export const scoreEndpoints = {
  readScores: defineEndpoint({
    name: 'readScores',
    method: 'GET',
    path: '/scores',
    summary:
      'Whether the odds come true, and what became of the plans: one’s own, or for a mentor those of their traders',
    access: { kind: 'desk', roles, rows: 'shared' },
    params: noInput,
    query: scoreFilterSchema,
    body: null,
    needsVersion: false,
    status: 200,
    response: scoresSchema,
  }),
};
