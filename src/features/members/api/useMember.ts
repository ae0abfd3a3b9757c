import { useQuery } from '@tanstack/react-query';
import { readEdition } from '#shared/contracts/bases.ts';
import { listMemberVersions, readMember } from '#shared/contracts/members.ts';
import { readStock } from '#shared/contracts/stock.ts';
import { call } from '#src/lib/api/call.ts';

export const memberKey = (id: string) => ['member', id] as const;

/** A member as the server has it. */
export function useMemberRecord(id: string) {
  return useQuery({
    queryKey: memberKey(id),
    queryFn: ({ signal }) => call(readMember, { params: { id }, signal }),
    staleTime: Infinity,
  });
}

/** An edition's document; a released one never changes, so it is fetched once. */
export function useEditionDocument(id: string | undefined) {
  return useQuery({
    queryKey: ['edition', id],
    queryFn: ({ signal }) => call(readEdition, { params: { id: id ?? '' }, signal }),
    enabled: id !== undefined,
    staleTime: Infinity,
  });
}

export function useStockList(id: string | null | undefined) {
  return useQuery({
    queryKey: ['stock', id],
    queryFn: ({ signal }) => call(readStock, { params: { id: id ?? '' }, signal }),
    enabled: typeof id === 'string',
    staleTime: 60_000,
  });
}

export function useVersions(id: string, wanted: boolean) {
  return useQuery({
    queryKey: ['member', id, 'versions'],
    queryFn: ({ signal }) => call(listMemberVersions, { params: { id }, signal }),
    enabled: wanted,
    staleTime: 0,
  });
}
