import { z } from 'zod';

/** Every code an answer can carry, with its HTTP status and what the reader can do about it. */
export const apiErrors = {
  'input-invalid': { status: 400, action: 'Correct the named fields and send it again.' },
  'request-malformed': { status: 400, action: 'Reload the page and try again.' },
  'not-signed-in': { status: 401, action: 'Sign in and try again. What you typed is kept.' },
  'credentials-wrong': { status: 401, action: 'Check the e-mail and the password.' },
  'request-forged': { status: 403, action: 'Open Brierbook in its own tab and try again.' },
  'not-allowed': { status: 403, action: 'Ask the lead of your desk.' },
  'not-found': { status: 404, action: 'Go back to the list; it may have been removed.' },
  'method-not-allowed': { status: 405, action: 'Reload the page and try again.' },
  'email-taken': { status: 409, action: 'Sign in with this e-mail, or use another one.' },
  'symbol-taken': { status: 409, action: 'Open the underlying that has this symbol, or choose another.' },
  'already-exists': { status: 409, action: 'Reload to see what is stored.' },
  'changed-elsewhere': { status: 409, action: 'Compare both versions, then keep one.' },
  'entry-sealed': { status: 409, action: 'A sealed forecast stays as it is. Start a new plan instead.' },
  'step-out-of-order': { status: 409, action: 'Reload to see where this stands.' },
  'fills-exist': { status: 409, action: 'Remove the fills first, or start a new plan.' },
  'invitation-invalid': { status: 410, action: 'Ask for a new invitation.' },
  'upload-expired': { status: 410, action: 'Choose the file again.' },
  'too-large': { status: 413, action: 'Use a smaller file or split it.' },
  'content-type-refused': { status: 415, action: 'Reload the page and try again.' },
  'file-unreadable': {
    status: 422,
    action: 'Check that the file opens in a spreadsheet and save it again as CSV or XLSX.',
  },
  'plan-incomplete': { status: 422, action: 'Complete the named parts of the plan.' },
  'engines-disagree': { status: 422, action: 'Check strike, premium and expiry of the named leg.' },
  'fill-impossible': { status: 422, action: 'Check the kind, the contract and the quantity of the fill.' },
  'version-missing': { status: 428, action: 'Reload the page and try again.' },
  'too-many-requests': { status: 429, action: 'Wait a moment and try again.' },
  internal: { status: 500, action: 'Try again. If it stays, tell the operator the number of this error.' },
  unavailable: { status: 503, action: 'Wait a moment and try again.' },
} as const satisfies Record<string, { status: number; action: string }>;

export type ApiErrorCode = keyof typeof apiErrors;
const codes = Object.keys(apiErrors) as [ApiErrorCode, ...ApiErrorCode[]]; // Object.keys widens to string[]
export const apiErrorCodeSchema = z.enum(codes);

/** The body of every answer that is not a success. */
export const apiErrorSchema = z.strictObject({
  error: z.strictObject({
    code: apiErrorCodeSchema,
    /** What happened, in one sentence. */
    message: z.string(),
    /** What to do, in one sentence. */
    action: z.string(),
    /** Named problems; `field` is a path such as `legs.0.strikePrice`, empty for the whole. */
    problems: z.array(z.strictObject({ field: z.string(), message: z.string() })),
    requestId: z.string(),
    /** The row as it stands now, where someone else changed it (code `changed-elsewhere`). */
    current: z.unknown().optional(),
  }),
});
export type ApiErrorBody = z.infer<typeof apiErrorSchema>;
