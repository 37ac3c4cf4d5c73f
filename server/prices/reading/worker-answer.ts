import { type PriceFileContent } from '@/server/prices/reading/interpret-table';
import { type PriceFileProblem } from '@/server/prices/reading/price-file-error';

export type WorkerAnswer =
  | { readonly kind: 'content'; readonly content: PriceFileContent }
  | { readonly kind: 'refused'; readonly code: PriceFileProblem; readonly message: string };
