import type { DemoPerson, DemoProject, PersonKey, ProjectKey } from './story';

/** One password for all five invented accounts; shown on the sign-in page while the demo is there. */
export const DEMO_PASSWORD = 'couplings-2026';

export const PEOPLE: Record<PersonKey, DemoPerson> = {
  petra: { name: 'Petra Halvorsen', email: 'petra.halvorsen@team.example', siteRole: 'administrator', roleWords: 'site administrator' },
  joris: { name: 'Joris Calder', email: 'joris.calder@team.example', siteRole: 'member', roleWords: 'project lead' },
  amina: { name: 'Amina Restell', email: 'amina.restell@team.example', siteRole: 'member', roleWords: 'reviewer' },
  tomas: { name: 'Tomás Erikson', email: 'tomas.erikson@team.example', siteRole: 'member', roleWords: 'chemist' },
  wen: { name: 'Wen Oakley', email: 'wen.oakley@partner.example', siteRole: 'member', roleWords: 'guest who reads, until a date' },
};

export const PROJECTS: Record<ProjectKey, DemoProject> = {
  VNL: {
    name: 'Vinyl linkers', notebookPattern: 'TE-000-00', claimHours: 48, reviewDays: 7, peerReview: false,
    members: [
      { person: 'joris', role: 'lead' }, { person: 'amina', role: 'reviewer' }, { person: 'tomas', role: 'chemist' },
      { person: 'wen', role: 'reader', guestForDays: 30 },
    ],
  },
  PIP: {
    name: 'Piperidinol series', notebookPattern: 'TE-000-00', claimHours: 24, reviewDays: 5, peerReview: false,
    members: [{ person: 'amina', role: 'lead' }, { person: 'joris', role: 'reviewer' }, { person: 'tomas', role: 'chemist' }],
  },
  IMP: {
    name: 'Batch impurities', notebookPattern: 'AR-000-00', claimHours: 24, reviewDays: 10, peerReview: false,
    members: [{ person: 'joris', role: 'lead' }, { person: 'tomas', role: 'reviewer' }, { person: 'amina', role: 'chemist' }],
  },
};
