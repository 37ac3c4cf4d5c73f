import { type DomainError } from '@/journal/errors/domain-error';
import { ApiFailure } from '@/server/errors/api-failure';

const words: Readonly<Record<string, { readonly field: string; readonly message: string }>> = {
  'settlement-exceeds-position': {
    field: 'quantity',
    message: 'More contracts would end than are open. Correct the quantity, or add the missing fill first.',
  },
  'settlement-side-wrong': {
    field: 'kind',
    message: 'Only a short option is assigned and only a long one exercised. Choose the other.',
  },
  'settlement-of-stock': { field: 'contract', message: 'Shares do not expire. Choose the option.' },
  'fill-repeated': { field: '', message: 'This fill was added already.' },
  'price-not-deliverable': { field: 'price', message: 'With delivery of shares the option ends at price 0.' },
};

/** What a person is told when fills together cannot have happened. */
export function fillProblemOf({ code }: DomainError): ApiFailure {
  const problem = words[code] ?? {
    field: '',
    message: `These fills do not fit together (${code}). Check kind, contract and quantity.`,
  };
  return new ApiFailure('fill-impossible', problem.message, [problem]);
}
