import { type NextFunction, type Request, type RequestHandler, type Response, Router } from 'express';
import { type MeService } from '@/server/account/me-service';
import { type DeskScope } from '@/server/database/desk-scope';
import { ApiFailure } from '@/server/errors/api-failure';
import { ForbiddenError } from '@/server/errors/forbidden-error';
import { readBody } from '@/server/http/read-body';
import { readInput } from '@/server/http/read-input';
import { fileOf, receiveFile } from '@/server/http/receive-file';
import { noteFacts } from '@/server/http/request-facts';
import { sendFile } from '@/server/http/send-file';
import { requestIdOf } from '@/server/http/request-id';
import { type PersonEntity } from '@/server/people/person-entity';
import { type Endpoint } from '@/shared/contract/define-endpoint';

type AnyHandler = (context: never) => Promise<unknown>;

interface Mounting {
  readonly endpoints: Readonly<Record<string, Endpoint>>;
  /** Keyed by endpoint name. */
  readonly handlers: Readonly<Record<string, AnyHandler>>;
  readonly me: MeService;
  readonly signedInPerson: (request: Request) => Promise<PersonEntity | null>;
}

/**
 * Mounts every endpoint of the contract on its handler, and nothing else.
 * @throws {Error} at start when an endpoint has no handler or a handler no endpoint.
 */
export function mountEndpoints(mounting: Mounting): Router {
  const { endpoints, handlers } = mounting;
  const missing = Object.keys(endpoints).filter((name) => !(name in handlers));
  const unknown = Object.keys(handlers).filter((name) => !(name in endpoints));
  if (missing.length + unknown.length > 0) {
    throw new Error(
      `Endpoints without handler: ${missing.join(', ') || 'none'}; handlers without endpoint: ${unknown.join(', ') || 'none'}.`,
    );
  }
  const router = Router();
  const methodsByPath = new Map<string, Set<string>>();
  for (const [name, endpoint] of Object.entries(endpoints)) {
    const handler = handlers[name];
    if (handler === undefined) continue; // refused above
    const chain: RequestHandler[] = [
      admit(mounting, endpoint),
      endpoint.body === 'file' ? receiveFile : readBody(endpoint),
      answer(endpoint, handler),
    ];
    router[methodKey(endpoint.method)](endpoint.path, ...chain);
    methodsByPath.set(endpoint.path, (methodsByPath.get(endpoint.path) ?? new Set()).add(endpoint.method));
  }
  for (const [path, methods] of methodsByPath) router.all(path, refuseMethod([...methods]));
  router.use((_, __, next) => next(new ApiFailure('not-found', 'There is no such address.')));
  return router;
}

const methodKey = (method: Endpoint['method']) =>
  (({ GET: 'get', POST: 'post', PUT: 'put', PATCH: 'patch', DELETE: 'delete' }) as const)[method];

function refuseMethod(methods: readonly string[]): RequestHandler {
  return (_, response, next) => {
    response.set('Allow', methods.join(', '));
    next(new ApiFailure('method-not-allowed', 'This address does not take that method.'));
  };
}

interface Admitted {
  readonly person?: PersonEntity;
  readonly scope?: DeskScope;
}
const admitted = new WeakMap<Request, Admitted>();

/** Lets in who may call, by what the database says now; everyone else is refused before anything is read. */
function admit({ me, signedInPerson }: Mounting, { name, access }: Endpoint): RequestHandler {
  return async (request: Request, _: Response, next: NextFunction) => {
    noteFacts(request, { endpoint: name });
    if (access.kind === 'public') {
      admitted.set(request, {});
      next();
      return;
    }
    const person = await signedInPerson(request);
    if (person === null) throw new ApiFailure('not-signed-in', 'You are not signed in, or your session has ended.');
    noteFacts(request, { personId: person.id });
    if (access.kind === 'signedIn') {
      admitted.set(request, { person });
      next();
      return;
    }
    const place = await me.placeOf(person.id, request.session.deskId);
    if (place === null) throw new ForbiddenError('You are on no desk.');
    noteFacts(request, { deskId: place.deskId });
    if (!access.roles.includes(place.role)) throw new ForbiddenError();
    admitted.set(request, { person, scope: me.scopeFor(person, place) });
    next();
  };
}

function answer(endpoint: Endpoint, handler: AnyHandler): RequestHandler {
  return async (request, response) => {
    const context = {
      ...admitted.get(request),
      params: readInput(endpoint.params, request.params),
      query: readInput(endpoint.query, request.query),
      body: endpoint.body === null || endpoint.body === 'file' ? undefined : readInput(endpoint.body, request.body),
      ...(endpoint.body === 'file' ? { file: fileOf(request, response) } : {}),
      ...(endpoint.needsVersion ? { version: versionOf(request) } : {}),
      request,
      requestId: requestIdOf(request),
    };
    if (endpoint.body === null) refuseBody(request);
    // The table ties each handler's context to its endpoint's schemas; here they are met as one family.
    const result = await handler(context as never);
    if (endpoint.response === null) response.status(endpoint.status).end();
    else if (endpoint.response === 'stream') await sendFile(response, result);
    else response.status(endpoint.status).json(endpoint.response.parse(result));
  };
}

function refuseBody(request: Request): void {
  const body: unknown = request.body;
  const isEmpty = body === undefined || (typeof body === 'object' && body !== null && Object.keys(body).length === 0);
  if (!isEmpty) throw new ApiFailure('input-invalid', 'This address takes no body.');
}

/** The version a change was made from, out of If-Match. */
function versionOf(request: Request): number {
  const text = request.get('if-match');
  if (text === undefined) throw new ApiFailure('version-missing', 'The request does not say which version it changes.');
  if (!/^[1-9]\d{0,8}$/.test(text))
    throw new ApiFailure('input-invalid', 'The version is not a whole number.', [
      { field: 'If-Match', message: 'Write a whole number.' },
    ]);
  return Number(text);
}
