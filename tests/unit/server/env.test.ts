import { neededDatabaseUrl, readEnv, SettingError } from '@/server/env';

const url = 'mariadb://app:pw@127.0.0.1:3306/throughbond';

it('has a default for all but the database', () => {
  const env = readEnv({});
  expect(env).toMatchObject({ mode: 'production', port: 4300, trustProxy: false, publicUrl: undefined, smtpUrl: undefined });
  expect(env.dataDir).toMatch(/\.data$/);
  expect(() => neededDatabaseUrl(env)).toThrow(SettingError);
});

it('takes a set but empty variable as not set', () => expect(readEnv({ PORT: '', PUBLIC_URL: ' ', TRUST_PROXY: '' })).toMatchObject({ port: 4300, trustProxy: false }));

it.each([['mariadb'], ['mysql']])('takes %s:// for the database', (scheme) => {
  const given = url.replace('mariadb', scheme);
  expect(readEnv({ DATABASE_URL: given }).databaseUrl).toBe(given);
});

it.each([
  ['1', 1], ['false', false], ['loopback', ['loopback']], ['10.0.0.0/8, 127.0.0.1', ['10.0.0.0/8', '127.0.0.1']],
])('reads TRUST_PROXY=%s', (text, wanted) => expect(readEnv({ TRUST_PROXY: text }).trustProxy).toEqual(wanted));

it('cuts the last stroke of PUBLIC_URL', () => expect(readEnv({ PUBLIC_URL: 'https://bond.example/' }).publicUrl).toBe('https://bond.example'));

it.each([
  [{ PORT: 'high' }, /^PORT must be a whole number\.$/],
  [{ PORT: '70000' }, /^PORT /],
  [{ DATABASE_URL: 'postgres://a:b@c/d' }, /^DATABASE_URL must have the form mariadb:\/\//],
  [{ DATABASE_URL: 'mariadb://app:pw@host:3306/' }, /^DATABASE_URL /],
  [{ PUBLIC_URL: 'bond.example' }, /^PUBLIC_URL must be an address/],
  [{ SMTP_URL: 'http://mail.example', PUBLIC_URL: 'https://bond.example' }, /^SMTP_URL /],
  [{ SMTP_URL: 'smtps://mail.example' }, /^PUBLIC_URL must be set/],
  [{ TRUST_PROXY: 'true' }, /^TRUST_PROXY .*would trust any header/],
  [{ NODE_ENV: 'staging' }, /^NODE_ENV /],
])('refuses %j in one sentence that names it', (given, sentence) => {
  expect(() => readEnv(given)).toThrow(SettingError);
  expect(() => readEnv(given)).toThrow(sentence);
});
