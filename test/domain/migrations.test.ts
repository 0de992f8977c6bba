import { openDatabase } from '#db/open-database';
import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { FIRST_ROWS } from '../support/first-rows';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const JOURNAL = path.join('db', 'migrations', 'meta', '_journal.json');

interface Journal {
  entries: { idx: number; tag: string }[];
}
const journal = JSON.parse(readFileSync(path.join(ROOT, JOURNAL), 'utf8')) as Journal;
const earlier = journal.entries.slice(0, -1);

/** What must come through: every reading with all it said, and the plan with its standing. */
const READINGS = 'select id, unit_id, attempt, value, entry, withdrawn_at, taken_by_id from readings order by id';
const PLANNED =
  'select r.revision, r.status, r.effective_at, c.content from plan_revisions r join plan_characteristics c on c.revision_id = r.id';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'quietrail-migrations-'));
});
afterEach(() => {
  rmSync(folder, { recursive: true, force: true });
});

/** The project's root as it was when this migration was the newest. */
function rootAt(last: number): string {
  cpSync(path.join(ROOT, 'db', 'migrations'), path.join(folder, 'db', 'migrations'), { recursive: true });
  const entries = journal.entries.filter(({ idx }) => idx <= last);
  writeFileSync(path.join(folder, JOURNAL), JSON.stringify({ ...journal, entries }));
  return folder;
}

describe('a database of an earlier version', () => {
  it.each(earlier)('that stood at $tag is brought to the newest with all its data', ({ idx }) => {
    const file = path.join(folder, 'quietrail.db');
    const old = openDatabase(file, rootAt(idx));
    old.$client.exec(FIRST_ROWS);
    const before = old.$client.prepare(READINGS).all();
    const planned = old.$client.prepare(PLANNED).all();
    old.$client.close();

    const renewed = openDatabase(file, ROOT);
    expect(renewed.$client.prepare(READINGS).all()).toEqual(before);
    expect(renewed.$client.prepare(PLANNED).all()).toEqual(planned);
    expect(before).toHaveLength(2);
    expect(planned).toHaveLength(1);
    expect(renewed.$client.pragma('integrity_check')).toEqual([{ integrity_check: 'ok' }]);
    expect(() => renewed.$client.exec('delete from plan_characteristics')).toThrow(/never edited/);
    expect(() => renewed.$client.exec('update readings set value = 12')).toThrow(/nothing else/);
    const fresh = openDatabase(':memory:', ROOT);
    const objects = "select type, name, sql from sqlite_master where name not like '__drizzle%' order by type, name";
    expect(renewed.$client.prepare(objects).all()).toEqual(fresh.$client.prepare(objects).all());
    renewed.$client.close();
    fresh.$client.close();
  });
});
