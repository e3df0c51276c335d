import { hzAsTyped, fixed } from '@/shared/format/number';
import { plainText } from '@/shared/format/richText';
import { GRADE_WORDS } from '@/shared/format/words';
import { quickText } from '@/shared/text/quick';
import type { QuickLookAnswer } from '@/shared/types/answer';

/** The answer as plain text for a notebook: grade first, nothing left out that limits it. */
export function copyText(answer: QuickLookAnswer, link: string): string {
  const j = hzAsTyped(answer.reading).replace(/\u00a0Hz$/, '');
  const list = (title: string, lines: readonly string[]) => (lines.length === 0 ? [] : ['', `${title}:`, ...lines.map((line) => `- ${line}`)]);
  const lines = [
    quickText.copyHead,
    quickText.copyReading(j, fixed(answer.reading.seHz, answer.reading.seHz < 0.1 ? 2 : 1)),
    `${GRADE_WORDS[answer.grade]}: ${answer.headline}`,
    answer.detail,
    ...list(quickText.rulesOut, answer.rulesOut),
    ...list(quickText.cannotTell, answer.cannotTell),
    ...list(quickText.cautions, answer.cautions.map((caution) => caution.text)),
    ...list(quickText.wouldDecide, answer.measureNext.map((next) => `${next.title}: ${next.detail}`)),
    '',
    ...(answer.relation ? [`${quickText.copyRelation}: ${answer.relation.name}, version ${answer.relation.version}. ${answer.relation.citation}`] : []),
    `${quickText.copyEngine(answer.engineVersion)}, ${link}`,
  ];
  return lines.map(plainText).join('\n');
}

/** True when the text is on the clipboard; false where a browser keeps it closed (a page without TLS, or a refusal). */
export async function copyToClipboard(text: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(text);
    return true;
  } catch {
    return false;
  }
}
