import type { CaseResponse } from '@/shared/contracts/cases';

import type { SayOf } from '../../quick/ReadingCard';

type Result = CaseResponse['trail']['calculations'][number]['result'];

/** What the engine said of a calculation's inputs, by field, in the form that the quick look's cards read. */
export function sayOfResult(result: Result | undefined, put: (field: string, value: string) => void): SayOf {
  return (field) => {
    if (result?.state === 'refused') {
      const problem = result.problems.find((each) => each.field === field);
      if (problem) return { error: problem.sentence, mends: problem.mends.map((mend) => ({ label: mend.label, onPress: () => put(mend.field, mend.value) })) };
    }
    if (result?.state === 'question' && result.field === field) return { error: result.question };
    return {};
  };
}
