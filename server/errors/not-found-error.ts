import { ApiFailure } from '@/server/errors/api-failure';

/** What is asked for does not exist, or is not the caller's to see: the two are never told apart. */
export class NotFoundError extends ApiFailure {
  constructor() {
    super('not-found', 'There is nothing here, or it is not yours to see.');
  }
}
