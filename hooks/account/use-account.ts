import { meQuery } from '@/hooks/account/use-me';
import { useEndpointMutation } from '@/hooks/client/use-endpoint-mutation';
import { accountEndpoints, type Me } from '@/shared/account/account-endpoints';
import { type QueryClient } from '@tanstack/react-query';

/** Another person or desk: nothing of the one before may stay in memory. */
function startAfresh(client: QueryClient, me: Me): void {
  client.clear();
  client.setQueryData(meQuery().queryKey, me);
}

export const useSignUp = () => useEndpointMutation(accountEndpoints.signUp, startAfresh);
export const useSignIn = () => useEndpointMutation(accountEndpoints.signIn, startAfresh);
export const useAcceptInvitation = () => useEndpointMutation(accountEndpoints.acceptInvitation, startAfresh);
export const useSwitchDesk = () => useEndpointMutation(accountEndpoints.switchDesk, startAfresh);
export const useEditProfile = () =>
  useEndpointMutation(accountEndpoints.editProfile, (client, me) => void client.setQueryData(meQuery().queryKey, me));
export const useSignOut = () =>
  useEndpointMutation(accountEndpoints.signOut, (client) => {
    client.clear();
    client.setQueryData(meQuery().queryKey, null);
  });
