import { newPasswordError } from '@/components/auth/passwordRule';
import { safePath } from '@/components/auth/safePath';
import { isDay } from '@/components/team/isDay';
import { wholeNumber } from '@/components/team/RulesCard';
import { ago, dayWords, isPast, momentWords, waited } from '@/shared/format/when';
import { shortName } from '@/shared/format/shortName';
import { LIMITS } from '@/shared/limits';

jest.mock('expo-router', () => ({ router: {} }));

describe('the way back after signing in', () => {
  it.each(['/', '/cases?state=draft&q=enol', '/cases/1f29c37e-8238-45f5-a72f-6d95130241fe/history?from=1&to=2', '/?j=8.9&bond=double'])('goes to %s', (path) => expect(safePath(path)).toBe(path));
  it.each([
    undefined, '', 'cases', '//evil.example/x', '/\\evil.example', 'https://evil.example/', 'javascript:alert(1)', '/ok\n//evil.example', '/\t/evil.example', '/sign-in?to=/sign-in', '/reset/abc',
  ])('does not follow %j', (path) => expect(safePath(path)).toBe('/cases'));
});

describe('small rules of the account and the team', () => {
  it('tell a new password\u2019s length', () => {
    expect(newPasswordError('x'.repeat(LIMITS.passwordMin))).toBeUndefined();
    expect(newPasswordError('x'.repeat(LIMITS.passwordMin - 1))).toBeDefined();
    expect(newPasswordError('x'.repeat(LIMITS.passwordMax + 1))).toBeDefined();
  });
  it('take days that exist and whole numbers within limits', () => {
    expect(isDay('2028-02-29')).toBe(true);
    expect(isDay('2027-02-29')).toBe(false);
    expect(isDay('31.3.2027')).toBe(false);
    expect(wholeNumber(' 24 ', { from: 1, to: 168 })).toBe(24);
    expect(wholeNumber('1.5', { from: 1, to: 168 })).toBeNull();
    expect(wholeNumber('169', { from: 1, to: 168 })).toBeNull();
  });
  it('shorten a name', () => {
    expect(shortName('Tomás Erikson')).toBe('T.\u00A0Erikson');
    expect(shortName('Plato')).toBe('Plato');
  });
});

describe('times on screen', () => {
  const now = new Date('2026-12-01T12:00:00Z');
  it('are short and coarse', () => {
    expect(ago('2026-12-01T11:59:40Z', now)).toBe('now');
    expect(ago('2026-12-01T12:05:00Z', now)).toBe('now');              // a clock that runs ahead
    expect(ago('2026-12-01T10:00:00Z', now)).toBe('2\u00A0h');
    expect(ago('2026-11-27T12:00:00Z', now)).toBe('4\u00A0d');
    expect(ago('2026-10-27T12:00:00Z', now)).toBe('5\u00A0wk');
    expect(waited('2026-11-30T12:00:00Z', now)).toBe('1\u00A0day');
  });
  it('name the year only when it is another one, in the zone of the reader', () => {
    expect(dayWords('2026-12-04', now)).toBe('4\u00A0Dec');
    expect(dayWords('2027-01-04', now)).toBe('4\u00A0Jan\u00A02027');
    expect(momentWords('2026-12-01T09:12:00Z', now, 'UTC')).toBe('09:12');
    expect(momentWords('2026-11-30T23:30:00Z', now, 'Europe/Berlin')).toBe('00:30');
    expect(momentWords('2026-11-30T16:05:00Z', now, 'UTC')).toBe('30\u00A0Nov, 16:05');
    expect(isPast('2026-11-30', now, 'UTC')).toBe(true);
    expect(isPast('2026-12-01', now, 'UTC')).toBe(false);
  });
});
