import { openDatabase } from '#db/open-database';
import { people } from '#db/schema/people';
import { planCharacteristics } from '#db/schema/plans';
import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { addPlannedPart, attribute, measured } from '../support/bench-fixtures';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const JOURNAL = path.join('db', 'migrations', 'meta', '_journal.json');

interface Journal {
  entries: { idx: number; tag: string }[];
}
const journal = JSON.parse(readFileSync(path.join(ROOT, JOURNAL), 'utf8')) as Journal;
const earlier = journal.entries.slice(0, -1);

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
    const author = old
      .insert(people)
      .values({ name: 'Quill Averard', email: 'quality@hollowmere.example' })
      .returning()
      .get();
    addPlannedPart(old, author.id, {
      level: 'II',
      classAqls: [{ class: 'major', aql: '1.0' }],
      characteristics: [measured('v_loaded', 'major', { lower: 11.4, upper: 12.9 }), attribute('polarity', 'major')],
    });
    const before = old.select().from(planCharacteristics).all();
    old.$client.close();

    const renewed = openDatabase(file, ROOT);
    expect(renewed.select().from(planCharacteristics).all()).toEqual(before);
    expect(renewed.$client.pragma('integrity_check')).toEqual([{ integrity_check: 'ok' }]);
    expect(() => renewed.$client.exec('delete from plan_characteristics')).toThrow(/never edited/);
    const fresh = openDatabase(':memory:', ROOT);
    const objects = "select type, name, sql from sqlite_master where name not like '__drizzle%' order by type, name";
    expect(renewed.$client.prepare(objects).all()).toEqual(fresh.$client.prepare(objects).all());
    renewed.$client.close();
    fresh.$client.close();
  });
});
