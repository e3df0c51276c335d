import type { SheetModel } from '@/server/pdf/model';
import { checkStates } from '@/server/features/cases/read';
import { sheetText as words } from '@/shared/text/sheet';
import { meaningWord, reviewStepWord } from '@/shared/text/reviews';
import { groupedHash, isSigned, time, type SheetInput } from './input';
import { literal } from '@/server/pdf/textLayout';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

function evidenceTable(input: SheetInput): SheetModel['judged']['evidence'] {
  const { content, record } = input;
  if (content.evidence.length === 0) return null;
  const about = (candidateId: string | null) => {
    const named = content.candidates.find(({ id }) => id === candidateId)?.name.trim();
    return named ? literal(named) : words.wholeCase;
  };
  return {
    caption: `${words.evidence}. ${words.evidenceNote}`,
    columns: [{ head: words.evidenceKind, share: 16, align: 'left' }, { head: words.evidenceText, share: 60, align: 'left' }, { head: words.bearing, share: 24, align: 'left' }],
    rows: content.evidence.map((entry) => {
      const bearing = { for: words.bearingFor, against: words.bearingAgainst, neutral: words.bearingNeutral }[entry.bearing](about(entry.candidateId));
      const files = entry.attachmentIds.flatMap((id) => record.attachments.find((file) => file.id === id)?.fileName ?? []).map(literal);
      return { cells: [words.evidenceWord[entry.kind], [literal(entry.text.trim()), ...(files.length > 0 ? [`(${files.join(', ')})`] : [])].join(' '), bearing] };
    }),
  };
}

function checksTable(input: SheetInput): SheetModel['judged']['checks'] {
  const { record, revision } = input;
  if (record.found.firstSubmittedRevision === null) return null;
  return {
    caption: words.checks,
    columns: [{ head: words.step, share: 36, align: 'left' }, { head: words.state, share: 16, align: 'left' }, { head: words.by, share: 24, align: 'left' }, { head: words.time, share: 24, align: 'left' }],
    rows: checkStates(record, revision.number, input.names).map((check) => ({
      cells: [capital(reviewStepWord[check.step]), words.checkWord[check.state], check.by ? literal(check.by.name) : '', check.at ? time(input, new Date(check.at)) : ''],
    })),
  };
}

export function judgedPart(input: SheetInput): SheetModel['judged'] {
  const { content, record, revision } = input;
  const { answer } = content;
  const paragraphs: [string, string][] = [];
  if (answer) {
    if (answer.reasons.trim() !== '') paragraphs.push([words.reasons, literal(answer.reasons.trim())]);
    if (answer.overrideReason.trim() !== '') paragraphs.push([words.override, literal(answer.overrideReason.trim())]);
  }
  const queries = record.queries.filter((query) => query.revision <= revision.number);
  const signatures = record.signatures.filter((one) => one.revision === revision.number);
  const reviewed = signatures.some(({ meaning }) => meaning !== 'authorship');
  return {
    summary: record.found.firstSubmittedRevision === null ? (answer ? words.notReviewed : words.noAnswerYet) : words.reviewSummary(queries.length, queries.filter(({ state }) => state === 'closed').length),
    paragraphs, evidence: evidenceTable(input), checks: checksTable(input),
    queries: queries.map((query) => ({
      head: words.queryHead(query.number, reviewStepWord[query.step], words.queryWord[query.state]),
      messages: (record.messages.get(query.id) ?? []).map((message) => words.message(literal(message.byName), time(input, message.at), literal(message.text))),
    })),
    signatures: signatures.length === 0 ? null : {
      caption: words.signatures,
      columns: [{ head: words.meaning, share: 20, align: 'left' }, { head: words.name, share: 26, align: 'left' }, { head: words.time, share: 26, align: 'left' }, { head: words.content, share: 28, align: 'left' }],
      rows: signatures.map((one) => ({ cells: [meaningWord[one.meaning], literal(one.signerName), time(input, one.signedAt), groupedHash(one.contentHash, 16)] })),
    },
    unsigned: isSigned(input) ? '' : reviewed ? '' : signatures.length > 0 ? words.onlyAuthor : words.noSignature,
    addenda: revision.number === record.found.revision
      ? record.addenda.map((one) => ({ head: words.addendum(one.number, literal(one.byName), time(input, one.at)), text: `${literal(one.text)} (${groupedHash(one.hash, 16)})` }))
      : [],
  };
}
