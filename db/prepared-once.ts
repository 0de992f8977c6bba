import { type Db } from './open-database';

/**
 * Drizzle keeps it out of its public types: a database and all its transactions share one session, that of its connection.
 * What is prepared on one is therefore run by the others too.
 */
interface OfSession {
  session: object;
}

/**
 * Keeps a statement that is asked for often: it is built and prepared once for each open database, and then only run. A value
 * that is bound to a placeholder passes its column's encoder also when it is null; bind nullable JSON and flags with `sql`.
 */
export function preparedOnce<Statement>(prepare: (db: Db) => Statement): (db: Db) => Statement {
  const kept = new WeakMap<object, Statement>();
  return (db) => {
    const { session } = db as unknown as OfSession;
    const known = kept.get(session);
    if (known !== undefined) return known;
    const made = prepare(db);
    kept.set(session, made);
    return made;
  };
}
