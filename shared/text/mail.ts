import { dateOnly, dateTimeUtc } from '../format/date';
import type { ProjectRole } from '../types/roles';

/** Mails in plain text. Each carries one address to open, on a line of its own. */
export interface MailWords {
  subject: string;
  text: string;
}

const ENDING = 'Throughbond';
const letter = (subject: string, paragraphs: readonly string[]): MailWords => ({ subject, text: `${[...paragraphs, ENDING].join('\n\n')}\n` });
const aRole = (role: ProjectRole, guestUntil: string | null): string => `${role}${guestUntil === null ? '' : `, as a guest until ${dateOnly(guestUntil)}`}`;

export const mailText = {
  invitation: ({ by, project, role, guestUntil, link, expires }: { by: string; project: string; role: ProjectRole; guestUntil: string | null; link: string; expires: Date }): MailWords =>
    letter(`${by} invites you to ${project}`, [
      `${by} invites you to the project ${project} in Throughbond: ${aRole(role, guestUntil)}.`,
      'Open this address to join:', link,
      `It works once, until ${dateTimeUtc(expires)}. If you do not know ${by}, leave it alone.`,
    ]),
  reset: ({ link, expires }: { link: string; expires: Date }): MailWords =>
    letter('Choose a new password', [
      'Somebody asked for a new password for this address in Throughbond. Open this address to choose one:', link,
      `It works once, until ${dateTimeUtc(expires)}. If it was not you, leave it alone: your password stays as it is.`,
    ]),
  passwordChanged: ({ at, link }: { at: Date; link: string }): MailWords =>
    letter('Your password was changed', [
      `The password of your account in Throughbond was changed on ${dateTimeUtc(at)}, and every other sign-in has ended.`,
      'If it was not you, choose a new one here at once:', link,
    ]),
} as const;
