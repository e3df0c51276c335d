// A migrated schema written down as statements, and made again from them: many times faster than every migration anew.
const { createConnection } = require('mariadb');

/**
 * @typedef {{ appUrl: string, ownerUrl: string }} Addresses
 */

/**
 * Opens a connection, hands it to `work`, and closes it.
 * @template T
 * @param {string} url
 * @param {(connection: import('mariadb').Connection) => Promise<T>} work
 * @returns {Promise<T>}
 */
async function withConnection(url, work) {
  const connection = await createConnection(url);
  try {
    return await work(connection);
  } finally {
    await connection.end();
  }
}

/** @param {string} name */
const quoted = (name) => `\`${name.replaceAll('`', '``')}\``;

/**
 * Tables, the rows that migrations put in, triggers, and what the application's user may do.
 * @param {Addresses} db a migrated schema
 * @returns {Promise<string[]>} `{{schema}}` stands for the name of the new schema
 */
async function readTemplate(db) {
  const schema = decodeURIComponent(new URL(db.ownerUrl).pathname.slice(1));
  /** @type {(url: string, sql: string) => Promise<string[][]>} */
  const rows = (url, sql) => withConnection(url, (connection) => connection.query({ sql, rowsAsArray: true }));
  const statements = ['SET FOREIGN_KEY_CHECKS = 0'];
  for (const [table] of await rows(db.ownerUrl, "SHOW FULL TABLES WHERE Table_type = 'BASE TABLE'")) {
    const [[, create]] = await rows(db.ownerUrl, `SHOW CREATE TABLE ${quoted(table)}`);
    statements.push(create.replace(/ AUTO_INCREMENT=\d+/, ''), `INSERT INTO ${quoted(table)} SELECT * FROM ${quoted(schema)}.${quoted(table)}`);
  }
  if ((await rows(db.ownerUrl, "SHOW FULL TABLES WHERE Table_type = 'VIEW'")).length > 0) throw new Error('readTemplate copies no views yet; the schema has one now.');
  for (const [trigger] of await rows(db.ownerUrl, 'SHOW TRIGGERS')) {
    const [[, , create]] = await rows(db.ownerUrl, `SHOW CREATE TRIGGER ${quoted(trigger)}`);
    statements.push(create.replace(/^CREATE DEFINER=\S+ /, 'CREATE '));
  }
  for (const [grant] of await rows(db.appUrl, 'SHOW GRANTS')) {
    const [, rights, at, database, object, user] = /^GRANT (.+) ON (`(.+?)`\.(\S+)) TO (\S+)/.exec(grant) ?? [];
    if (at && database === schema) statements.push(`GRANT ${rights} ON {{schema}}.${object} TO ${user}`);
  }
  statements.push('SET FOREIGN_KEY_CHECKS = 1');
  return statements;
}

/**
 * Makes a schema of this name from the template.
 * @param {Addresses} db
 * @param {string[]} template
 * @param {string} name
 * @returns {Promise<Addresses>} its addresses for owner and application
 */
async function makeSchema(db, template, name) {
  await withConnection(db.ownerUrl, async (owner) => {
    await owner.query(`CREATE DATABASE ${quoted(name)} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
    await owner.query(`USE ${quoted(name)}`);
    for (const statement of template) await owner.query(statement.replaceAll('{{schema}}', quoted(name)));
  });
  /** @param {string} url */
  const named = (url) => url.replace(/\/[^/]*$/, `/${name}`);
  return { appUrl: named(db.appUrl), ownerUrl: named(db.ownerUrl) };
}

module.exports = { makeSchema, readTemplate, withConnection };
