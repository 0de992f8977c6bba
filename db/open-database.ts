import Sqlite from 'better-sqlite3';
import { drizzle } from 'drizzle-orm/better-sqlite3';
import { migrate } from 'drizzle-orm/better-sqlite3/migrator';
import { type BaseSQLiteDatabase } from 'drizzle-orm/sqlite-core';
import path from 'node:path';
import * as schema from './schema/index';

/** The database, or a transaction of it: queries take either. */
export type Db = BaseSQLiteDatabase<'sync', Sqlite.RunResult, typeof schema>;

export type Database = ReturnType<typeof openDatabase>;

/**
 * Opens (or creates) the database file and brings it to the newest schema.
 * WAL with synchronous=FULL: a write that was acknowledged survives a power cut.
 *
 * @param file path of the database, or `:memory:`
 * @param root the project's root, where db/migrations lies
 */
export function openDatabase(file: string, root: string) {
  const client = new Sqlite(file);
  client.pragma('journal_mode = WAL');
  client.pragma('synchronous = FULL');
  client.pragma('busy_timeout = 5000');
  const db = drizzle(client, { schema, casing: 'snake_case' });
  // Foreign keys are off while tables are rebuilt by a migration, and checked afterwards.
  client.pragma('foreign_keys = OFF');
  migrate(db, { migrationsFolder: path.join(root, 'db', 'migrations') });
  const broken = client.pragma('foreign_key_check') as unknown[];
  if (broken.length > 0) throw new Error(`The database has ${broken.length} rows that refer to nothing.`);
  client.pragma('foreign_keys = ON');
  return db;
}
