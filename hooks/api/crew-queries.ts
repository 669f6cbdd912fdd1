import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Role } from '@/shared/roles';
import { callApi } from './client';
import { queryKeys } from './query-keys';

export const crewQuery = () =>
  queryOptions({ queryKey: queryKeys.crew, queryFn: async ({ signal }) => (await callApi('crew', { signal })).people });

export function useChangeRoles() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ personId, roles }: { personId: string; roles: Role[] }) =>
      callApi('changeRoles', { params: { personId }, body: { roles } }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.crew }),
  });
}
