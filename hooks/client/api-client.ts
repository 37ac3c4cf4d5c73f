import { ApiError, unreachable } from '@/hooks/client/api-error';
import {
  type BodyOf,
  type Endpoint,
  type ParamsOf,
  type QueryInputOf,
  type ResponseOf,
} from '@/shared/contract/define-endpoint';
import { apiErrorSchema } from '@/shared/contract/error-codes';
import { apiRoot, requestHeader } from '@/shared/contract/request-headers';

/** Browsers let 64 kB of such writes wait together; characters may take more than a byte. */
const KEEPALIVE_LIMIT = 16_000;

/** What one call needs; parts the endpoint does not take are left out. */
export interface CallInput<E extends Endpoint> {
  readonly params?: ParamsOf<E>;
  readonly query?: QueryInputOf<E>;
  readonly body?: BodyOf<E>;
  /** The version the change was made from, for endpoints that need it. */
  readonly version?: number;
  readonly signal?: AbortSignal;
}

/**
 * Calls an endpoint of the contract.
 * @throws {ApiError} with the server's words, or 'unreachable' when there is no answer.
 */
export async function call<E extends Endpoint>(endpoint: E, input: CallInput<E> = {}): Promise<ResponseOf<E>> {
  const answer = await send(endpoint, input);
  if (answer.ok) {
    const { response } = endpoint;
    // The schema is the endpoint's own, so what it gives is ResponseOf<E>; TypeScript cannot follow the conditional type.
    if (response === null || response === 'stream') return undefined as ResponseOf<E>;
    return response.parse(await answer.json()) as ResponseOf<E>;
  }
  throw await readError(answer);
}

async function send<E extends Endpoint>(
  endpoint: E,
  { params, query, body, version, signal }: CallInput<E>,
): Promise<Response> {
  const headers = new Headers();
  if (endpoint.method !== 'GET') headers.set(requestHeader.name, requestHeader.value);
  if (version !== undefined) headers.set('if-match', String(version));
  if (endpoint.body !== 'file' && body !== undefined) headers.set('content-type', 'application/json');
  const text = endpoint.body === 'file' || body === undefined ? undefined : JSON.stringify(body);
  try {
    return await fetch(urlOf(endpoint, params, query), {
      method: endpoint.method,
      headers,
      body: endpoint.body === 'file' ? fileForm(body) : text,
      signal,
      credentials: 'same-origin',
      // A small write goes on when the page is left or reloaded while it is under way.
      keepalive: endpoint.method !== 'GET' && endpoint.body !== 'file' && (text?.length ?? 0) < KEEPALIVE_LIMIT,
    });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw unreachable();
  }
}

/** The address of an endpoint that is opened as a link, such as a file to save. */
export function linkTo<E extends Endpoint>(
  endpoint: E,
  { params, query }: Pick<CallInput<E>, 'params' | 'query'>,
): string {
  return urlOf(endpoint, params, query);
}

function urlOf(endpoint: Endpoint, params: unknown, query: unknown): string {
  const values = new Map(Object.entries(params ?? {}));
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(values.get(name))));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {})) {
    if (value !== undefined) search.set(name, String(value));
  }
  const text = search.toString();
  return `${apiRoot}${path}${text === '' ? '' : `?${text}`}`;
}

function fileForm(body: unknown): FormData {
  if (!(body instanceof File)) throw new TypeError('This endpoint takes a file.');
  const form = new FormData();
  form.set('file', body, body.name);
  return form;
}

async function readError(answer: Response): Promise<ApiError> {
  const parsed = apiErrorSchema.safeParse(await answer.json().catch(() => null));
  if (parsed.success) return new ApiError(parsed.data.error);
  return answer.status >= 500
    ? new ApiError({
        code: 'unavailable',
        message: 'Brierbook did not answer as it should.',
        action: 'Wait a moment and try again.',
        problems: [],
      })
    : unreachable();
}
