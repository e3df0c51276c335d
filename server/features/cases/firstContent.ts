import { Problem } from '@/server/http/problems';
import { contentFromQuickLook } from '@/shared/engine';
import { casesText } from '@/shared/text/cases';
import type { QuickLookInput } from '@/shared/types/answer';
import type { CaseContent } from '@/shared/types/case';
import type { CaseDeps } from './deps';

export interface NewCase {
  projectId: string;
  question?: string | undefined;
  compoundName?: string | undefined;
  quickLook?: QuickLookInput | undefined;
}

const EMPTY: CaseContent = {
  format: 1, question: '', compound: { name: '', batch: '', notebook: '', structureNote: '', formerNames: [] },
  conditions: { fieldMHz: '', solvent: '', temperatureK: '', concentration: '' },
  readings: [], calculations: [], candidates: [], evidence: [], answer: null, tags: [],
};

/** What a new case begins with: the quick look whole, or an empty sheet with its question. @throws Problem when the quick look cannot be read */
export function firstContent(deps: Pick<CaseDeps, 'quickLook'>, request: NewCase): CaseContent {
  const { quickLook, question, compoundName } = request;
  let content = EMPTY;
  if (quickLook) {
    const result = deps.quickLook(quickLook);
    if (result.state === 'refused') {
      const [first] = result.problems;
      throw new Problem('invalid-input', first?.sentence ?? casesText.gap.noReading, {
        errors: result.problems.map(({ field, code, sentence, mends }) => ({ pointer: `#/quickLook/${field.split('.').join('/')}`, detail: sentence, code, mends })),
      });
    }
    content = contentFromQuickLook(quickLook, result);
  }
  return {
    ...content,
    question: question ?? (content.question.trim() === '' ? casesText.untitled : content.question),
    compound: { ...content.compound, name: compoundName ?? content.compound.name },
  };
}
