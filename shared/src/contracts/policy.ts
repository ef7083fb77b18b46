import { z } from 'zod';

/** Who may do what: one pure function. The server decides by it, the dashboard hides by it and never decides. */

export const role = z.enum(['operator', 'engineer', 'manager', 'admin']);
export type Role = z.infer<typeof role>;

export const actions = [
  'ranking:read',
  'valves:read',
  'valves:write',
  'trends:read',
  'trends:take-in',
  'runs:read',
  'runs:start',
  'people:read',
  'people:write',
  'audit:read',
] as const;
export type Action = (typeof actions)[number];

/** A signed-in person as far as permission goes. `areas` is null for a person of all areas. */
export interface Actor {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
  readonly areas: readonly string[] | null;
}

const allowed: Record<Role, readonly Action[]> = {
  operator: ['ranking:read', 'valves:read', 'trends:read', 'trends:take-in', 'runs:read'],
  engineer: [
    'ranking:read',
    'valves:read',
    'valves:write',
    'trends:read',
    'trends:take-in',
    'runs:read',
    'runs:start',
  ],
  manager: ['ranking:read', 'valves:read', 'trends:read', 'runs:read'],
  admin: [...actions],
};

/**
 * May this actor do this, to something in this area?
 *
 * @param areaId the area of the thing acted on; left out, the question is whether the role may do it anywhere
 */
export function may(actor: Pick<Actor, 'role' | 'areas'>, action: Action, areaId?: string): boolean {
  return allowed[actor.role].includes(action) && (areaId === undefined || seesArea(actor, areaId));
}

/** Does this actor see things of this area at all? */
export function seesArea(actor: Pick<Actor, 'areas'>, areaId: string): boolean {
  return actor.areas === null || actor.areas.includes(areaId);
}
