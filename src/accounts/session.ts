// Who is signed in, asked once and shared by every page.
import { queryOptions, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { getMe, signOut, type Me } from '../../shared/accounts/contract';
import { call, rememberCsrfToken } from '../http/client';

export type SignedIn = NonNullable<Me['user']>;

export const meQuery = queryOptions({
  queryKey: ['me'],
  queryFn: async ({ signal }): Promise<Me> => {
    const me = await call(getMe, { signal });
    rememberCsrfToken(me.csrfToken);
    return me;
  },
  staleTime: 60_000,
});

/** `undefined` while it isn't known yet, `null` when nobody is signed in. */
export function useUser(): SignedIn | null | undefined {
  return useQuery(meQuery).data?.user;
}

/** Who is signed in stays, because the header is watching it. */
function forgetTheRest(client: QueryClient): void {
  client.removeQueries({ predicate: (query) => query.queryKey[0] !== meQuery.queryKey[0] });
}

/** After signing in or up: everything read before belonged to somebody else. */
export function useTakeSession(): (me: Me) => void {
  const client = useQueryClient();
  return (me) => {
    rememberCsrfToken(me.csrfToken);
    client.setQueryData(meQuery.queryKey, me);
    forgetTheRest(client);
  };
}

/** An answer about the same person: a new name, a new session. What was read stays true. */
export function useTakeMe(): (me: Me) => void {
  const client = useQueryClient();
  return (me) => {
    rememberCsrfToken(me.csrfToken);
    client.setQueryData(meQuery.queryKey, me);
  };
}

/** The session is over on the server: asks who is there now, and forgets what was read under it. */
export function useLeave(): () => Promise<void> {
  const client = useQueryClient();
  return async () => {
    await client.fetchQuery({ ...meQuery, staleTime: 0 });
    forgetTheRest(client);
  };
}

/** Ends the session on the server, then forgets what was read under it. */
export function useSignOut(onDone: () => void): () => void {
  const leave = useLeave();
  const { mutate } = useMutation({
    mutationFn: () => call(signOut),
    onSuccess: async () => {
      await leave();
      onDone();
    },
  });
  return mutate;
}
