export const SITE_ROLES = ['administrator', 'member'] as const;
export type SiteRole = (typeof SITE_ROLES)[number];

/** Ascending: a lead may all that a reviewer may, and so on, but the independence rule stands above roles. */
export const PROJECT_ROLES = ['reader', 'chemist', 'reviewer', 'lead'] as const;
export type ProjectRole = (typeof PROJECT_ROLES)[number];

export const SIGNATURE_MEANINGS = ['authorship', 'review', 'approval'] as const;
export type SignatureMeaning = (typeof SIGNATURE_MEANINGS)[number];
