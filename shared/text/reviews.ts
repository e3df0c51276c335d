import type { SignatureMeaning } from '../types/roles';
import type { ReviewStep } from '../types/trail';

/** The check-list by trail step, in the order a reviewer walks it. */
export const reviewStepWord: Record<ReviewStep, string> = {
  reciprocity: 'readings and pairs',
  domain: 'relation in its domain',
  'second-root': 'second root excluded',
  'other-evidence': 'other evidence',
  alternatives: 'alternatives tested',
};

export const meaningWord: Record<SignatureMeaning, string> = { authorship: 'Authorship', review: 'Review', approval: 'Approval' };
export const meaningSentence: Record<SignatureMeaning, string> = {
  authorship: 'I made this case and stand by its readings',
  review: 'I checked each step of the trail',
  approval: 'The team may rely on this answer',
};

export const reviewsText = {
  noSuchQuery: 'No such query in your projects.',
  queryClosed: 'This query is closed: open a new one.',
  noSuchStep: 'This step is not in the trail of the present revision: load the case again.',
  heldByAnother: (name: string, until: string) => `${name} holds this case until ${until}. Nothing was changed.`,
  otherRevision: 'The case has a newer revision than the one you looked at: load it again, then check.',
  seen: 'Read the new version, then decide. Nothing was signed.',
  event: {
    claimed: 'Taken for review',
    released: 'Released',
    releasedFor: (name: string) => `Claim of ${name} released`,
    checked: (step: string) => `Checked: ${step}`,
    unchecked: (step: string) => `Check taken back: ${step}`,
    queryOpened: (number: number, step: string) => `Query ${number} opened at ${step}`,
    queryAnswered: (number: number) => `Query ${number} answered`,
    queryAskedAgain: (number: number) => `Query ${number} asked again`,
    queryClosed: (number: number) => `Query ${number} closed`,
    signed: (meaning: string, revision: number) => `Revision ${revision} signed: ${meaning.toLowerCase()}`,
  },
} as const;
