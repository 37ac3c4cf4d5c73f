import { type z } from 'zod';
import { type Role } from '@/shared/contract/roles';

/**
 * Who may call: anyone; anyone signed in; or a member of the active desk holding one of the roles.
 * `own` says that the rows are the caller's own: someone else's row is simply not found.
 * `shared` widens reading to sealed entries of traders the caller mentors.
 */
export type Access =
  | { readonly kind: 'public' }
  | { readonly kind: 'signedIn' }
  | { readonly kind: 'desk'; readonly roles: readonly Role[]; readonly rows: 'desk' | 'own' | 'shared' };

export interface Endpoint {
  /** Unique, camel case; the server's handlers and the client's hooks are keyed by it. */
  readonly name: string;
  readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** Under /api/v1, with :params. */
  readonly path: `/${string}`;
  readonly summary: string;
  readonly access: Access;
  readonly params: z.ZodType;
  readonly query: z.ZodType;
  /** JSON body; null for none, 'file' for one multipart file in the part `file`. */
  readonly body: z.ZodType | null | 'file';
  /** Writes that must name the version they were made from (header If-Match). */
  readonly needsVersion: boolean;
  readonly status: 200 | 201 | 204;
  /** null with status 204; 'stream' for a file that is written as it is made. */
  readonly response: z.ZodType | null | 'stream';
}

/** Declares an endpoint; the value is its own type, so params, body and response are inferred from it. */
export function defineEndpoint<const E extends Endpoint>(endpoint: E): E {
  return endpoint;
}

export type ParamsOf<E extends Endpoint> = z.output<E['params']>;
export type QueryOf<E extends Endpoint> = z.output<E['query']>;
/** What a caller may pass: defaults can be left out. */
export type QueryInputOf<E extends Endpoint> = z.input<E['query']>;
export type BodyOf<E extends Endpoint> = E['body'] extends z.ZodType
  ? z.output<E['body']>
  : E['body'] extends 'file'
    ? File
    : undefined;
export type ResponseOf<E extends Endpoint> = E['response'] extends z.ZodType ? z.output<E['response']> : undefined;

type DeepReadonly<T> = T extends readonly (infer Item)[]
  ? readonly DeepReadonly<Item>[]
  : T extends object
    ? { readonly [Key in keyof T]: DeepReadonly<T[Key]> }
    : T;
/** A file that is written while it is made. */
export interface StreamedFile {
  readonly fileName: string;
  readonly contentType: string;
  /** Pieces in order; what cannot be made ends the answer in the middle, so that no half file looks whole. */
  readonly pieces: AsyncIterable<string | Uint8Array>;
}

/** What a handler may return: the response before it is parsed, its arrays and objects allowed to be readonly. */
export type AnswerOf<E extends Endpoint> = E['response'] extends z.ZodType
  ? DeepReadonly<z.input<E['response']>>
  : E['response'] extends 'stream'
    ? StreamedFile
    : undefined;
