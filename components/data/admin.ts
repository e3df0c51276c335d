import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';

import type { AdminUsersResponse } from '@/shared/contracts/team';
import type { SiteRole } from '@/shared/types/roles';

import { api } from './api';
import type { ApiProblem } from './problems';

export const adminOptions = queryOptions<AdminUsersResponse, ApiProblem>({ queryKey: ['admin', 'users'], queryFn: ({ signal }) => api.get('/api/admin/users', 'adminUsersResponse', { signal }) });
export const useAdminUsers = (enabled: boolean) => useQuery({ ...adminOptions, enabled });

export function useChangeUser() {
  const client = useQueryClient();
  return useMutation<AdminUsersResponse, ApiProblem, { userId: string; siteRole: SiteRole; status: 'active' | 'disabled' }>({
    mutationFn: ({ userId, ...change }) => api.put(`/api/admin/users/${userId}`, change, 'adminUsersResponse'),
    onSuccess: (users) => { client.setQueryData(adminOptions.queryKey, users); },
  });
}
