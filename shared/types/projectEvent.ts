import type { ProjectRole } from './roles';

export const PROJECT_SETTINGS = ['name', 'notebookPattern', 'claimHours', 'reviewDays', 'peerReview'] as const;
export type ProjectSetting = (typeof PROJECT_SETTINGS)[number];

/**
 * What a line of a project's log holds. Stored as it is and never changed: a new kind or field is added beside, and the
 * reader of the old form stays.
 */
export type ProjectEvent =
  | { format: 1; kind: 'project-created' }
  | { format: 1; kind: 'member-added'; person: string; role: ProjectRole; guestUntil: string | null }
  | { format: 1; kind: 'member-changed'; person: string; before: Standing; after: Standing }
  | { format: 1; kind: 'member-removed'; person: string; role: ProjectRole }
  | { format: 1; kind: 'settings-changed'; changes: { setting: ProjectSetting; before: string; after: string }[] }
  | { format: 1; kind: 'invitation-sent'; email: string; role: ProjectRole; guestUntil: string | null }
  | { format: 1; kind: 'invitation-withdrawn'; email: string };

/** What somebody is in a project, and until when; null = without an end. */
export interface Standing {
  role: ProjectRole;
  guestUntil: string | null;
}
