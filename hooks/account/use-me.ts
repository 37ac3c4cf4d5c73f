import { queryOptions, useQuery } from '@tanstack/react-query';
import { call } from '@/hooks/client/api-client';
import { ApiError } from '@/hooks/client/api-error';
import { accountEndpoints, type Me } from '@/shared/account/account-endpoints';
import { journalRoles } from '@/shared/contract/roles';

export const meQuery = () =>
  queryOptions({
    queryKey: ['me'],
    queryFn: async ({ signal }): Promise<Me | null> => {
      try {
        return await call(accountEndpoints.readMe, { signal });
      } catch (error) {
        if (error instanceof ApiError && error.code === 'not-signed-in') return null; // nobody: not a failure
        throw error;
      }
    },
    staleTime: 60_000,
    retry: 1,
  });

/** Who is signed in; null when nobody is. */
export const useMe = () => useQuery(meQuery());

/** Whether the reader keeps a journal of their own on this desk. */
export function useKeepsJournal(): boolean {
  const { data: me } = useMe();
  return me !== undefined && me !== null && journalRoles.includes(me.desk.role);
}
