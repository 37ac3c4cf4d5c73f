import { ApiFailure } from '@/server/errors/api-failure';

/** It existed and has ended: an invitation used up, an upload cleared away. */
export class GoneError extends ApiFailure {
  constructor(code: 'invitation-invalid' | 'upload-expired', message: string) {
    super(code, message, []);
  }
}
