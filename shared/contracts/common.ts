import { z } from 'zod';

import { GRADES } from '../types/answer';
import { INKS, REVIEW_STEPS } from '../types/trail';
import { PROJECT_ROLES, SIGNATURE_MEANINGS, SITE_ROLES } from '../types/roles';
import { CASE_STATES } from '../types/case';
import { LIMITS } from '../limits';

export const id = z.uuid();
/** Server time, ISO 8601 in UTC. */
export const instant = z.iso.datetime();
export const day = z.iso.date();
export const grade = z.enum(GRADES);
export const ink = z.enum(INKS);
export const reviewStep = z.enum(REVIEW_STEPS);
export const caseState = z.enum(CASE_STATES);
export const projectRole = z.enum(PROJECT_ROLES);
export const siteRole = z.enum(SITE_ROLES);
export const signatureMeaning = z.enum(SIGNATURE_MEANINGS);
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
export const email = z.string().trim().toLowerCase().max(LIMITS.email).pipe(z.email('Write the address as name@place.example.'));
export const password = z.string().min(LIMITS.passwordMin, `At least ${LIMITS.passwordMin} characters.`).max(LIMITS.passwordMax, `At most ${LIMITS.passwordMax} characters.`);

export const person = z.object({ id, name: z.string() });
export type Person = z.infer<typeof person>;

/** Free text from a form: trimmed at the ends, never empty unless `optionalText`. */
export const text = (max: number) => z.string().trim().min(1, 'This is empty: write it, or leave the form.').max(max, `At most ${max} characters.`);
export const optionalText = (max: number) => z.string().trim().max(max, `At most ${max} characters.`);

export const done = z.object({ done: z.literal(true) });
