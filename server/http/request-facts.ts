/** What the log says about a request: which endpoint, whose, on which desk; ids only. */
export interface RequestFacts {
  readonly endpoint?: string;
  readonly personId?: string;
  readonly deskId?: string;
}

const factsByRequest = new WeakMap<object, RequestFacts>();

export function noteFacts(request: object, facts: RequestFacts): void {
  factsByRequest.set(request, { ...factsByRequest.get(request), ...facts });
}

export function factsOf(request: object): RequestFacts {
  return factsByRequest.get(request) ?? {};
}
