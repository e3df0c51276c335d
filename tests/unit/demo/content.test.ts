import { DEMO_CASES } from '@/server/db/demo/content';
import { demoFile } from '@/server/db/demo/files';
import { storyClock } from '@/server/db/demo/moments';
import { DEMO_PASSWORD, PEOPLE, PROJECTS } from '@/server/db/demo/people';
import { at, DEMO_FILE_KEYS, PERSON_KEYS, PROJECT_KEYS } from '@/server/db/demo/story';
import { quickLook } from '@/shared/engine';
import { LIMITS } from '@/shared/limits';
import { heldForTests } from '../../helpers/registry';

const registry = heldForTests();
const num = (typed: string): number => Number(typed.replace(',', '.').replace(/^(ca\.|<)\s*/, ''));
const PLANTED = 'partner-differs';

describe('the people and projects of the demo', () => {
  it('are five accounts at addresses that can never be real, with a password the product would take', () => {
    expect(PERSON_KEYS).toHaveLength(5);
    for (const { email } of Object.values(PEOPLE)) expect(email).toMatch(/^[a-z.]+@[a-z]+\.example$/);
    expect(DEMO_PASSWORD.length).toBeGreaterThanOrEqual(LIMITS.passwordMin);
  });
  it('cover administrator, lead, reviewer, chemist, and a guest with an end', () => {
    expect(Object.values(PEOPLE).some(({ siteRole }) => siteRole === 'administrator')).toBe(true);
    const members = PROJECT_KEYS.flatMap((key) => PROJECTS[key].members);
    for (const role of ['lead', 'reviewer', 'chemist', 'reader']) expect(members.map((member) => member.role)).toContain(role);
    expect(members.some(({ guestForDays }) => guestForDays !== undefined)).toBe(true);
    for (const key of PROJECT_KEYS) expect(PROJECTS[key].members.filter(({ role }) => role === 'lead')).toHaveLength(1);
  });
});

describe('the cases of the demo', () => {
  it('are about twenty-five, each told once', () => {
    expect(DEMO_CASES.length).toBeGreaterThanOrEqual(24);
    expect(DEMO_CASES.length).toBeLessThanOrEqual(28);
    expect(new Set(DEMO_CASES.map(({ key }) => key)).size).toBe(DEMO_CASES.length);
  });

  it.each(DEMO_CASES.map((one) => [one.key, one] as const))('%s tells its acts in the order of time, by members of its project', (_key, one) => {
    const clock = storyClock(new Date('2026-06-15T18:00:00Z'));
    const times = one.acts.map((act) => clock.instant(act.at).getTime());
    expect([...times].sort((a, b) => a - b)).toEqual(times);
    const members = PROJECTS[one.project].members.map(({ person }) => person);
    for (const act of one.acts) expect(members).toContain('by' in act && act.by !== undefined ? act.by : one.author);
  });

  it.each(DEMO_CASES.map((one) => [one.key, one] as const))('%s has partners that agree within 2σ, unless the slip is planted', (key, one) => {
    const pairs = one.content.readings.filter(({ partner }) => partner !== '');
    const apart = pairs.filter(({ j, partner, se }) => Math.abs(num(j) - num(partner)) > 2 * Math.SQRT2 * Number(se || '0.2') + 1e-9);
    expect(apart.map(({ id }) => id)).toEqual(key === PLANTED ? ['r1'] : []);
  });

  it.each(DEMO_CASES.map((one) => [one.key, one] as const))('%s names readings, candidates and evidence that are there', (_key, { content }) => {
    const ids = (rows: { id: string }[]): string[] => rows.map(({ id }) => id);
    for (const { readingId } of content.calculations) expect(ids(content.readings)).toContain(readingId);
    for (const { claims } of content.candidates) for (const { calculationId } of claims) expect(ids(content.calculations)).toContain(calculationId);
    for (const { candidateId } of content.evidence) if (candidateId !== null) expect(ids(content.candidates)).toContain(candidateId);
    if (content.answer !== null && content.answer.candidateId !== null) expect(ids(content.candidates)).toContain(content.answer.candidateId);
  });

  it('hold, as the engine sees them, what a newcomer should meet', () => {
    const looks = DEMO_CASES.flatMap(({ key, content }) => content.calculations.map(({ id, readingId, ...calculation }) => {
      const reading = content.readings.find((one) => one.id === readingId);
      if (reading === undefined) throw new Error(`${key} has lost the reading of ${id}`);
      return { key, result: quickLook({ ...calculation, j: reading.j, ...(reading.se === '' ? {} : { se: reading.se }), ...(reading.partner === '' ? {} : { partner: reading.partner }) }, registry) };
    }));
    const of = (key: string) => looks.filter((look) => look.key === key).map(({ result }) => result);
    const cautions = (key: string) => of(key).flatMap((result) => (result.state === 'answered' ? result.cautions.map(({ id }) => id) : []));
    const notes = (key: string) => of(key).flatMap((result) => (result.state === 'refused' ? [] : result.notes.map(({ code }) => code)));
    expect(looks.filter(({ result }) => result.state !== 'answered')).toEqual([]);
    expect(cautions('partner-differs')).toContain('partner-differs');
    expect(cautions('no-root')).toContain('beyond-reach');
    expect(cautions('chain')).toContain('may-be-averaged');
    expect(cautions('limit')).toContain('limit-used');
    expect(cautions('trisubstituted')).toContain('no-vicinal-path');
    expect(cautions('enol-ether')).toContain('alkene-border');
    expect(cautions('chloride')).toContain('polar-carbon');
    expect(cautions('ring-enone')).toContain('ring-fact');
    expect(notes('crotonamide')).toContain('decimal-comma');
    expect(notes('quick-note')).toContain('approximate');
  });
});

describe('the files of the demo', () => {
  it('are small, the same each time, and what their names say', () => {
    for (const key of DEMO_FILE_KEYS) {
      expect(demoFile(key).bytes.equals(demoFile(key).bytes)).toBe(true);
      expect(demoFile(key).bytes.length).toBeLessThan(20_000);
    }
    expect(demoFile('multiplet').bytes.subarray(0, 8)).toEqual(Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]));
  });
  it('give in the peak list the coupling that the case states', () => {
    const lines = demoFile('peakList').bytes.toString('utf8').split('\r\n').filter((line) => /^\d/.test(line)).map((line) => Number(line.split(',')[2]));
    expect((lines[0] as number) - (lines[1] as number)).toBeCloseTo(15.7, 2);
    expect((lines[2] as number) - (lines[3] as number)).toBeCloseTo(15.7, 2);
  });
});

describe('the clock of the story', () => {
  it('counts back from the day of loading and never runs ahead of it', () => {
    const clock = storyClock(new Date('2026-06-15T08:00:00Z'));
    expect(clock.instant(at(2, '09:30')).toISOString()).toBe('2026-06-13T09:30:00.000Z');
    expect(clock.instant(at(0, '23:00')).toISOString()).toBe('2026-06-15T08:00:00.000Z');
    expect(clock.day(3)).toBe('2026-06-18');
  });
});
