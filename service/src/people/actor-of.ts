import { type Actor } from '@tailrace/shared/contracts/policy';
import { PersonEntity } from './person.entity.js';

/** A person as far as permission goes. */
export function actorOf(person: PersonEntity): Actor {
  return {
    id: person.id,
    name: person.name,
    role: person.role,
    areas: person.allAreas ? null : person.areas.map((area) => area.id),
  };
}
