import { type Db } from '#db/open-database';
import { people } from '#db/schema/people';
import { racks } from '#db/schema/racks';

/** Who took readings: names of everybody and of every rack, by id. */
export interface BenchNames {
  people: ReadonlyMap<number, string>;
  racks: ReadonlyMap<number, string>;
}

export function namesOf(db: Db): BenchNames {
  const persons = db.select({ id: people.id, name: people.name }).from(people).all();
  const machines = db.select({ id: racks.id, name: racks.name }).from(racks).all();
  return {
    people: new Map(persons.map(({ id, name }) => [id, name])),
    racks: new Map(machines.map(({ id, name }) => [id, name])),
  };
}
