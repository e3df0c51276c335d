import { dateOnly } from '../format/date';
import type { ProjectEvent, ProjectSetting, Standing } from '../types/projectEvent';

/** Lines of a project's log, as the Team page and a hand-over read them. */
const standing = ({ role, guestUntil }: Standing): string => (guestUntil === null ? role : `${role}, guest until ${dateOnly(guestUntil)}`);

const settingNames: Readonly<Record<ProjectSetting, string>> = {
  name: 'name', notebookPattern: 'form of notebook pages', claimHours: 'hours a reviewer holds a case', reviewDays: 'days until a review is due',
  peerReview: 'chemists review each other',
};
const orNothing = (value: string): string => (value === '' ? 'nothing' : value);

export function projectEventText(event: ProjectEvent): string {
  switch (event.kind) {
    case 'project-created':
      return 'Opened the project.';
    case 'member-added':
      return `${event.person} joined as ${standing(event)}.`;
    case 'member-changed':
      return `${event.person} is now ${standing(event.after)} (before: ${standing(event.before)}).`;
    case 'member-removed':
      return `${event.person} (${event.role}) left the project.`;
    case 'settings-changed':
      return `Changed ${event.changes.map(({ setting, before, after }) => `${settingNames[setting]} from ${orNothing(before)} to ${orNothing(after)}`).join('; ')}.`;
    case 'invitation-sent':
      return `Invited ${event.email} as ${standing(event)}.`;
    case 'invitation-withdrawn':
      return `Withdrew the invitation of ${event.email}.`;
  }
}
export const yesNo = (value: boolean): string => (value ? 'yes' : 'no');
