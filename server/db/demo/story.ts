import type { CaseContent } from '@/shared/types/case';
import type { ProjectRole, SiteRole } from '@/shared/types/roles';
import type { ReviewStep } from '@/shared/types/trail';

/** The demo is a story: five invented people, three invented projects, and what happened to each case, act by act. */
export const PERSON_KEYS = ['petra', 'joris', 'amina', 'tomas', 'wen'] as const;
export type PersonKey = (typeof PERSON_KEYS)[number];

export const PROJECT_KEYS = ['VNL', 'PIP', 'IMP'] as const;
export type ProjectKey = (typeof PROJECT_KEYS)[number];

export interface DemoPerson {
  name: string;
  email: string;
  siteRole: SiteRole;
  /** shown beside the account on the sign-in page */
  roleWords: string;
}

export interface DemoMember {
  person: PersonKey;
  role: ProjectRole;
  /** a guest's access ends so many days after the demo was loaded */
  guestForDays?: number;
}

export interface DemoProject {
  name: string;
  notebookPattern: string;
  claimHours: number;
  reviewDays: number;
  peerReview: boolean;
  members: DemoMember[];
}

/** A moment of the story, counted back from the day the demo is loaded. */
export interface Moment {
  daysAgo: number;
  /** HH:MM in UTC */
  time: string;
}

export type DemoAct =
  | { act: 'save'; by?: PersonKey; reason?: string; change: (content: CaseContent) => CaseContent }
  | { act: 'attach'; file: DemoFileKey; evidenceId: string; reason?: string }
  | { act: 'comment'; by: PersonKey; target: string; text: string; resolvedBy?: PersonKey }
  | { act: 'submit'; dueInDays?: number }
  | { act: 'reopen' }
  | { act: 'claim'; by: PersonKey }
  | { act: 'check'; by: PersonKey; steps: ReviewStep[] }
  | { act: 'query'; by: PersonKey; step: ReviewStep; text: string }
  | { act: 'reply'; by?: PersonKey; query: number; text: string }
  | { act: 'close'; by: PersonKey; query: number; text?: string }
  | { act: 'sign'; by: PersonKey; meaning: 'review' | 'approval' }
  | { act: 'addendum'; by?: PersonKey; text: string }
  | { act: 'withdraw'; by?: PersonKey; reason: string }
  | { act: 'supersede'; by?: PersonKey; reason: string; successor: string };

export const DEMO_FILE_KEYS = ['peakList', 'multiplet'] as const;
export type DemoFileKey = (typeof DEMO_FILE_KEYS)[number];

/** Acts without `by` are the author's. */
export type TimedAct = DemoAct & { at: Moment };

export interface DemoCase {
  /** names the case inside the story; a successor opened by `supersede` is named there and continues here */
  key: string;
  project: ProjectKey;
  author: PersonKey;
  /** null = opened by the `supersede` act of another case */
  opened: Moment | null;
  content: CaseContent;
  acts: TimedAct[];
}

export const at = (daysAgo: number, time: string): Moment => ({ daysAgo, time });
