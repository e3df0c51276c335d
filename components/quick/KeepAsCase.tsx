import { useMutation, useQueryClient } from '@tanstack/react-query';
import { router } from 'expo-router';
import { useState } from 'react';

import type { CaseResponse } from '@/shared/contracts/cases';
import type { QuickLookRequest } from '@/shared/contracts/quickLook';
import { quickText } from '@/shared/text/quick';

import { api } from '../data/api';
import type { ApiProblem } from '../data/problems';
import { useSession } from '../data/session';
import { Button } from '../ui/Button';
import { RadioRow, RadioRows } from '../ui/Choice';
import { Notice } from '../ui/Notice';
import { Sheet } from '../ui/Sheet';
import { herePath, signInPath } from '../shell/places';

/**
 * "Keep as a case": nothing is typed again. Signed out, it leads to the sign-in page and back here with the inputs kept in
 * the address.
 */
export function KeepAsCase({ request, answered, grow }: { request: QuickLookRequest | null; answered: boolean; grow?: number }) {
  const [choosing, setChoosing] = useState(false);
  const { data: session } = useSession();
  const client = useQueryClient();
  const keep = useMutation<CaseResponse, ApiProblem, { projectId: string; quickLook: QuickLookRequest }>({
    mutationFn: (body) => api.post('/api/cases', body, 'caseResponse'),
    onSuccess: (kept) => {
      void client.invalidateQueries({ queryKey: ['cases'] });
      router.push(`/cases/${kept.id}`);
    },
    onError: () => setChoosing(true),
  });
  const projects = session?.user?.projects.filter((project) => project.role !== 'reader') ?? [];
  const press = () => {
    if (!request) return;
    if (!session?.user) return router.push(signInPath(herePath()));
    const only = projects.length === 1 ? projects[0] : undefined;
    if (only) keep.mutate({ projectId: only.id, quickLook: request });
    else setChoosing(true);
  };
  return (
    <>
      <Button grow={grow} kind="primary" label={quickText.keep} onPress={press} busy={keep.isPending && quickText.keeping}
        disabledBecause={request === null ? quickText.keepNothing : answered ? undefined : quickText.keepNotReady} />
      {choosing && request && (
        <Sheet title={quickText.keepTitle} onClose={() => { setChoosing(false); keep.reset(); }}>
          {keep.error && <Notice tone="error" text={`**${quickText.keepFailed}** ${keep.error.detail}`} />}
          {projects.length === 0 && <Notice text={quickText.keepNoProject} />}
          <RadioRows label={quickText.keepTitle}>
            {projects.map((project) => (
              <RadioRow key={project.id} label={project.name} detail={project.key} chosen={keep.isPending && keep.variables.projectId === project.id}
                onPress={() => { if (!keep.isPending) keep.mutate({ projectId: project.id, quickLook: request }); }} />
            ))}
          </RadioRows>
        </Sheet>
      )}
    </>
  );
}
