import { casesText, capitalWord } from '@/shared/text/cases';
import type { CaseContent } from '@/shared/types/case';
import type { CaseTrail } from '@/shared/types/trail';
import { readingLabel } from './listing';

const words = casesText.target;
const LISTS = { readings: 'reading', calculations: 'calculation', candidates: 'candidate', evidence: 'evidence' } as const;
type List = keyof typeof LISTS;
const isList = (name: string): name is List => name in LISTS;

function rowLabel(content: CaseContent, list: List, rowId: string): string | null {
  const index = content[list].findIndex(({ id }) => id === rowId);
  if (index < 0) return null;
  if (list === 'readings') return readingLabel(content.readings[index]!, index);
  if (list === 'calculations') {
    const at = content.readings.findIndex(({ id }) => id === content.calculations[index]!.readingId);
    return `${words.calculation} ${at >= 0 ? readingLabel(content.readings[at]!, at) : index + 1}`;
  }
  if (list === 'candidates') return content.candidates[index]!.name.trim() || `${words.candidate} ${index + 1}`;
  return `${words.evidence} ${index + 1}`;
}

/**
 * The name of the value that a comment stands at. A target is the path of a value in the content (`question`,
 * `compound/name`, `readings/<row id>/j`, with `.` as well) or the key of a step of the trail; null when the case holds no such value.
 */
export function targetLabel(target: string, content: CaseContent, trail: CaseTrail): string | null {
  const step = trail.steps.find(({ key }) => key === target);
  if (step) return step.title;
  const [head = '', rowId = '', field = ''] = target.replace(/^[#/]+/, '').split(/[/.]/);
  if (head === 'case') return words.whole;
  if (isList(head)) {
    if (rowId === '') return capitalWord(head);
    const label = rowLabel(content, head, rowId);
    return label === null ? null : field === '' ? label : `${label}, ${field}`;
  }
  if (head === 'question' || head === 'answer') return rowId === '' ? words[head] : `${words[head]}, ${rowId}`;
  if (head === 'compound' || head === 'conditions') {
    if (rowId === '') return words[head];
    return Object.hasOwn(content[head], rowId) ? `${words[head]}, ${rowId}` : null;
  }
  return null;
}
