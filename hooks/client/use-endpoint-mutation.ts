import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { call, type CallInput } from '@/hooks/client/api-client';
import { type ApiError } from '@/hooks/client/api-error';
import { type Endpoint, type ResponseOf } from '@/shared/contract/define-endpoint';

/** A mutation over one endpoint; `onDone` puts the answer where the queries find it. */
export function useEndpointMutation<E extends Endpoint>(
  endpoint: E,
  onDone: (client: QueryClient, answer: ResponseOf<E>, input: CallInput<E>) => void | Promise<void>,
) {
  const client = useQueryClient();
  return useMutation<ResponseOf<E>, ApiError, CallInput<E>>({
    mutationFn: (input) => call(endpoint, input),
    onSuccess: (answer, input) => onDone(client, answer, input),
  });
}
