import { ApiFailure } from '@/server/errors/api-failure';

/** The caller is known and may not do this. */
export class ForbiddenError extends ApiFailure {
  constructor(message = 'Your role on this desk does not allow that.') {
    super('not-allowed', message);
  }
}
