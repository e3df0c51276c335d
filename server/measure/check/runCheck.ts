import type { Api } from '../lib/api';
import { ADAPTERS } from './adapters';
import { judge } from './compare';
import type { Judged } from './report';
import type { Check } from './types';

/** Puts each check's `given` to the product through its adapter and judges what came, in the file's order. */
export async function runChecks(checks: Check[], api: Api): Promise<Judged[]> {
  const judged: Judged[] = [];
  for (const check of checks) {
    const adapter = ADAPTERS[check.relation];
    const came = adapter === undefined
      ? { kind: 'not-covered' as const, reason: 'no such relation yet' }
      : await adapter(check.given, api);
    judged.push({ check, judgement: judge(check, came) });
  }
  return judged;
}
