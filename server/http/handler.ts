import { type Request } from 'express';
import { type DeskScope } from '@/server/database/desk-scope';
import { type PersonEntity } from '@/server/people/person-entity';
import {
  type AnswerOf,
  type BodyOf,
  type Endpoint,
  type ParamsOf,
  type QueryOf,
} from '@/shared/contract/define-endpoint';

/** A file as it was received; it is removed when the request ends. */
export interface UploadedFile {
  readonly path: string;
  readonly originalName: string;
  readonly sizeBytes: number;
}

interface ContextBase<E extends Endpoint> {
  readonly params: ParamsOf<E>;
  readonly query: QueryOf<E>;
  readonly body: E['body'] extends 'file' ? undefined : BodyOf<E>;
  readonly request: Request;
  readonly requestId: string;
}
type FileContext<E extends Endpoint> = E['body'] extends 'file' ? { readonly file: UploadedFile } : unknown;
type VersionContext<E extends Endpoint> = E['needsVersion'] extends true ? { readonly version: number } : unknown;
type AccessContext<E extends Endpoint> = E['access'] extends { kind: 'desk' }
  ? { readonly scope: DeskScope; readonly person: PersonEntity }
  : E['access'] extends { kind: 'signedIn' }
    ? { readonly person: PersonEntity }
    : unknown;

/** Everything a handler may use: the validated copy of what was sent, and who sent it as the database knows them. */
export type HandlerContext<E extends Endpoint> = ContextBase<E> & FileContext<E> & VersionContext<E> & AccessContext<E>;
export type Handler<E extends Endpoint> = (context: HandlerContext<E>) => Promise<AnswerOf<E>>;
/** One handler for each endpoint of a group, keyed by the endpoint's name. */
export type HandlersOf<Group extends Readonly<Record<string, Endpoint>>> = {
  readonly [Name in keyof Group]: Handler<Group[Name]>;
};
