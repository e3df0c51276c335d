import { freshDatabase, type FreshDatabase } from '../helpers/database';

let one: FreshDatabase;
let other: FreshDatabase;
beforeAll(async () => {
  [one, other] = await Promise.all([freshDatabase(), freshDatabase()]);
});
afterAll(async () => {
  await one.drop();
  await other.drop();
});

const names = (rows: Record<string, unknown>[]) => rows.map((row) => String(Object.values(row)[0])).sort();

describe('a test database', () => {
  it('has every table and trigger of the migrated schema, and rows of its own', async () => {
    const tables = names(await one.asOwner('SHOW TABLES'));
    expect(tables.length).toBeGreaterThan(10);
    expect(names(await other.asOwner('SHOW TABLES'))).toEqual(tables);
    expect(names(await one.asOwner('SHOW TRIGGERS'))).toEqual(names(await other.asOwner('SHOW TRIGGERS')));
    expect(one.schema).not.toBe(other.schema);
  });

  it('is reached by an application user who owns nothing, as in the product', async () => {
    const [table] = names(await one.asApp('SHOW TABLES'));
    await expect(one.asApp(`DROP TABLE \`${table}\``)).rejects.toThrow(/command denied/);
    await expect(one.asApp('CREATE TABLE extra (id INT)')).rejects.toThrow(/command denied/);
    for (const trigger of names(await one.asOwner('SHOW TRIGGERS'))) await expect(one.asApp(`DROP TRIGGER \`${trigger}\``)).rejects.toThrow(/command denied/);
  });
});
