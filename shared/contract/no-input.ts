import { z } from 'zod';

/** For endpoints without params or query: any key is refused. */
export const noInput = z.strictObject({});
