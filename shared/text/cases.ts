import { STATE_WORDS } from '../format/words';
import type { CaseState } from '../types/case';

/** Words of the server about cases: refusals, gaps before review, events of the log. `_x_` marks italics. */
const stateWord = STATE_WORDS;

const list = (items: readonly string[]): string =>
  items.length <= 1 ? (items[0] ?? '') : `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]!}`;
const queries = (numbers: readonly number[]): string =>
  numbers.length === 1 ? `query ${numbers[0]!}` : `queries ${list(numbers.map(String))}`;
const capital = (sentence: string): string => sentence.charAt(0).toUpperCase() + sentence.slice(1);

export const casesText = {
  notFound: 'No such case in your projects.',
  noSuchRevision: (code: string, revision: number) => `${code} has no revision ${revision}.`,
  noSuchComment: 'No such comment in your projects.',
  notFoundProject: 'No such project among yours.',
  staleCursor: 'This list has moved on: load it again from the top.',
  changed: 'Someone else saved this case meanwhile. Your entries are still on screen: compare both and save again.',
  changedState: (state: CaseState) => `The case is ${stateWord[state]} by now: load it again, then decide.`,
  reasonNeeded: 'Say in a few words why this changes: the case has been in review.',
  unknownAttachment: 'This file is not among the attachments of the case: attach it first.',
  unknownReading: 'This calculation names a reading that is not in the case.',
  doubleId: 'Two rows carry the same id: add the row again.',
  untitled: 'New question',
  wrongPassword: 'That is not your password. Nothing was signed.',
  passwordToSubmit: 'Type your password: sending to review signs the authorship of this revision.',
  chooseBond: 'This structure has several double bonds: choose one in the quick look first.',
  pastDay: 'This day is over: choose one from today on.',
  hashMismatch: 'The stored revision does not match its hash, so nothing was signed: tell an administrator.',

  refused: {
    notMember: 'You are not a member of this project.',
    readerOnly: 'Your role in this project is to read.',
    ownCase: 'You are the author: someone else reviews this case.',
    savedRevision: (revision: number) => `You saved revision ${revision} of this case: someone else reviews it.`,
    notReviewer: 'Reviewers and leads of the project review cases.',
    notInReview: (state: CaseState) => `The case is ${stateWord[state]}, not in review.`,
    heldBy: (name: string, until: string) => `${name} holds this case until ${until}.`,
    nobodyHolds: 'Nobody holds this case.',
    takeFirst: 'Take the case first.',
    readOnly: (state: CaseState) => state === 'in-review'
      ? 'In review the content stays as it was sent. The author may reopen it as a draft.'
      : state === 'signed' ? 'A signed case is not changed. Add an addendum, or supersede it.' : `The case is ${stateWord[state]} and stays as it is.`,
    holderAsks: 'You hold this review: ask in a query, or give the case back before you change it.',
    closed: (state: CaseState) => `The case is ${stateWord[state]} and stays as it is.`,
    authorSubmits: 'The author sends the case to review.',
    alreadySent: (state: CaseState) => state === 'in-review' ? 'The case is in review already.' : `The case is ${stateWord[state]}.`,
    answerFirst: (numbers: readonly number[]) => `Answer ${queries(numbers)} first.`,
    noQuery: 'There is no query to answer.',
    authorAnswers: 'The author answers, and the reviewer who holds the case replies.',
    signOpens: (numbers: readonly number[], steps: readonly string[]) => {
      const conditions = [
        ...(numbers.length > 0 ? [`${queries(numbers)} ${numbers.length === 1 ? 'is' : 'are'} closed`] : []),
        ...(steps.length > 0 ? [`${list(steps)} ${steps.length === 1 ? 'is' : 'are'} checked`] : []),
      ];
      return `Sign opens when ${list(conditions)}.`;
    },
    changedUnsent: 'Sign opens when the author has sent the present revision to review.',
    authorOrLead: 'The author or a lead of the project does this.',
    onlySigned: 'This is for signed cases.',
    successor: (code: string) => `${code} is being prepared to supersede this case.`,
  },

  gap: {
    question: 'Write the question this case decides.',
    noReading: 'Enter at least one measured coupling.',
    noCalculation: 'Calculate at least one reading: no relation has spoken yet.',
    unread: (what: string, sentence: string) => `${what} cannot be read: ${sentence}`,
    noNumber: 'it holds no number. Type the splitting in Hz.',
    missingFact: (what: string, question: string) => `${what} needs one more fact: ${question}`,
    candidates: 'Name at least two candidates, or answer not decided: one candidate alone decides nothing.',
    candidateName: 'Name this candidate.',
    noAnswer: 'Write your answer: assigned, tentative or not decided.',
    noReasons: 'Give the reasons for your answer.',
    noCandidate: 'Say which candidate the answer names, or answer not decided.',
    unknownCandidate: 'The answer names a candidate that is not in the case: choose again.',
    override: (computed: string) => `Your answer differs from the calculated one (${computed}): say why.`,
  },

  event: {
    created: 'Case opened',
    createdFromQuickLook: 'Case opened from a quick look',
    createdToSupersede: (code: string) => `Case opened to supersede ${code}`,
    saved: (revision: number, changes: number) => `Revision ${revision} saved, ${changes === 1 ? '1 field' : `${changes} fields`} changed`,
    submitted: (revision: number) => `Revision ${revision} sent to review`,
    resubmitted: (revision: number) => `Revision ${revision} sent back to review`,
    authorship: (revision: number) => `Authorship of revision ${revision} signed`,
    withdrawn: 'Withdrawn',
    reopened: 'Reopened as a draft',
    supersedeStarted: (code: string) => `${code} opened to supersede this case`,
    reason: (event: string, reason: string) => `${event}. Reason: ${reason}`,
    superseded: (code: string) => `Superseded by ${code}`,
    commented: (label: string) => `Comment at ${label}`,
    resolved: (label: string) => `Comment at ${label} resolved`,
    unresolved: (label: string) => `Comment at ${label} opened again`,
    attached: (fileName: string) => `File ${fileName} attached`,
    addendum: (number: number) => `Addendum ${number} signed`,
  },

  target: {
    whole: 'the case',
    question: 'question', compound: 'compound', conditions: 'conditions', answer: 'answer',
    reading: 'reading', calculation: 'calculation', candidate: 'candidate', evidence: 'evidence',
    unknown: 'No such value in this case: load it again, then comment.',
  },

  attachment: {
    notFound: 'No such file in your projects.',
    empty: 'The file is empty: choose another.',
    tooLarge: 'A file may have up to 10 MB.',
    name: 'Send the name of the file, percent-encoded, at most 200 characters.',
    disguised: (what: string) => `This file is ${what}, and such files are not kept here: attach a picture, a PDF, an archive or plain data.`,
    unknown: 'What kind of file this is cannot be told from its content: attach a picture, a PDF, an archive, or text such as CSV, JCAMP-DX or a molfile.',
    tooMany: 'At most 50 files a case.',
    missing: 'The file is listed but its bytes are not on the disk: tell an administrator.',
    kinds: { program: 'a program', html: 'a web page', svg: 'an SVG drawing', script: 'a script' },
  },
} as const;

export const joinWords = list;
export const queryWords = queries;
export const capitalWord = capital;
