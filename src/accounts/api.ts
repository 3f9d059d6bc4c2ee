// The questions and answers of accounts on the page: sessions, a seller's face and terms, its team.
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Duty } from '../../shared/accounts/actor';
import { endSession, listSessions } from '../../shared/accounts/contract';
import {
  cancelInvite,
  getSeller,
  getTeam,
  getTerms,
  inviteMember,
  removeMember,
  setDuties,
  type Team,
} from '../../shared/accounts/seller-contract';
import { call } from '../http/client';
import { errorWords } from '../ui/error-state';
import { sayDone, sayStop } from '../ui/notices';
import { meQuery } from './session';

export const sessionsQuery = queryOptions({
  queryKey: ['accounts', 'sessions'],
  queryFn: ({ signal }) => call(listSessions, { signal }),
});

export const sellerQuery = (id: string) =>
  queryOptions({
    queryKey: ['accounts', 'seller', id],
    queryFn: ({ signal }) => call(getSeller, { params: { id }, signal }),
  });

export const termsQuery = (id: string) =>
  queryOptions({
    queryKey: ['accounts', 'terms', id],
    queryFn: ({ signal }) => call(getTerms, { params: { id }, signal }),
    // A form is filled from it: another window's change must not run over what is being typed.
    refetchOnWindowFocus: false,
  });

export const teamQuery = (id: string) =>
  queryOptions({
    queryKey: ['accounts', 'team', id],
    queryFn: ({ signal }) => call(getTeam, { params: { id }, signal }),
  });

const sayWhy = (error: Error): void => sayStop(errorWords(error).detail);

export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => call(endSession, { params: { id } }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: sessionsQuery.queryKey });
      sayDone('Signed out there');
    },
    onError: sayWhy,
  });
}

/** Every change of a team answers with the team as it is then. */
export function useTeamChanges(sellerId: string) {
  const client = useQueryClient();
  const take = async (team: Team): Promise<void> => {
    client.setQueryData(teamQuery(sellerId).queryKey, team);
    // Who changes a team may have changed what they themselves may do.
    await client.invalidateQueries({ queryKey: meQuery.queryKey });
  };
  const params = { id: sellerId };
  return {
    invite: useMutation({
      mutationFn: (body: { email: string; duties: Duty[] }) => call(inviteMember, { params, body }),
      onSuccess: take,
    }),
    cancel: useMutation({
      mutationFn: (inviteId: string) => call(cancelInvite, { params: { ...params, inviteId } }),
      onSuccess: take,
      onError: sayWhy,
    }),
    setDuties: useMutation({
      mutationFn: (input: { userId: string; duties: Duty[] }) =>
        call(setDuties, { params: { ...params, userId: input.userId }, body: { duties: input.duties } }),
      onSuccess: take,
    }),
    remove: useMutation({
      mutationFn: (userId: string) => call(removeMember, { params: { ...params, userId } }),
      onSuccess: take,
      onError: sayWhy,
    }),
  };
}
