import { queryOptions, useQuery } from '@tanstack/react-query';

import type { MailboxResponse } from '@/shared/contracts/team';

import { api } from './api';
import type { ApiProblem } from './problems';

export const mailboxOptions = queryOptions<MailboxResponse, ApiProblem>({ queryKey: ['mailbox'], queryFn: ({ signal }) => api.get('/api/mailbox', 'mailboxResponse', { signal }) });
export const useMailbox = () => useQuery(mailboxOptions);
