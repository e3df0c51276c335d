import type { ProjectRole } from '@/shared/types/roles';

/**
 * What a line of the project's log holds. Stored as it is and never changed: a new kind or field is added beside, and
 * the reader of the old form stays.
 */
export type ProjectEvent =
  | { format: 1; kind: 'project-created' }
  | { format: 1; kind: 'member-added'; person: string; role: ProjectRole; guestUntil: string | null }
  | { format: 1; kind: 'member-changed'; person: string; before: { role: ProjectRole; guestUntil: string | null }; after: { role: ProjectRole; guestUntil: string | null } }
  | { format: 1; kind: 'member-removed'; person: string; role: ProjectRole }
  | { format: 1; kind: 'settings-changed'; changes: { setting: ProjectSetting; before: string; after: string }[] }
  | { format: 1; kind: 'invitation-sent'; email: string; role: ProjectRole; guestUntil: string | null }
  | { format: 1; kind: 'invitation-withdrawn'; email: string };

export const PROJECT_SETTINGS = ['name', 'notebookPattern', 'claimHours', 'reviewDays', 'peerReview'] as const;
export type ProjectSetting = (typeof PROJECT_SETTINGS)[number];
