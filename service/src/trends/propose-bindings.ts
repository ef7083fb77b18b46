import { type SignalRole } from '@tailrace/shared/core/series';

/** A valve a tag could belong to. */
export interface Candidate {
  readonly id: string;
  readonly tag: string;
  readonly roles: ReadonlySet<SignalRole>;
}

/** Endings and letters that plants give the points of a control valve. [common practice, no source] */
const roleByEnding: readonly (readonly [RegExp, SignalRole])[] = [
  [/(^|[._-])(op|out|cv|mv|dem|demand)$/i, 'demand'],
  [/(^|[._-])(zt|pos|position|zi|travel|pv_pos)$/i, 'position'],
  [/(^|[._-])(sp|setpoint|set)$/i, 'setPoint'],
  [/(^|[._-])(mode|mod)$/i, 'mode'],
  [/(^|[._-])(p1|pin|pt1)$/i, 'upstreamPressure'],
  [/(^|[._-])(p2|pout|pt2)$/i, 'downstreamPressure'],
  [/(^|[._-])(ft|flow|fi|q)$/i, 'flow'],
  [/(^|[._-])(tt|temp|ti)$/i, 'temperature'],
  [/(^|[._-])(pv)$/i, 'processValue'],
];

const numberOf = (tag: string) => /\d{2,}[A-Z]?/i.exec(tag)?.[0].toUpperCase() ?? null;

/**
 * Proposes the valve and the role of an unknown tag by likeness of names: the tag begins with the valve's tag, or
 * shares its number, and its ending or its first letters say what it measures. A person confirms it.
 *
 * @returns null where no valve or more than one is as near, or nothing says the role
 */
export function proposeBinding(
  historianTag: string,
  valves: readonly Candidate[],
): { readonly valve: Candidate; readonly role: SignalRole } | null {
  const lower = historianTag.toLowerCase();
  const named = valves.filter(({ tag }) => lower.startsWith(tag.toLowerCase()));
  const number = numberOf(historianTag);
  const near =
    named.length > 0 ? named : valves.filter(({ tag }) => number !== null && numberOf(tag) === number);
  const longest = Math.max(0, ...near.map(({ tag }) => tag.length));
  const best = named.length > 0 ? named.filter(({ tag }) => tag.length === longest) : near;
  const [valve] = best;
  if (!valve || best.length > 1) return null;
  const rest = named.length > 0 ? historianTag.slice(valve.tag.length) : historianTag;
  const role = roleByEnding.find(([pattern]) => pattern.test(rest))?.[1] ?? roleByLetters(historianTag);
  return role !== null && !valve.roles.has(role) ? { valve, role } : null;
}

/** The instrument letters a tag begins with: FT a flow, ZT a position. */
function roleByLetters(tag: string): SignalRole | null {
  const letters = /^[A-Z]+/i.exec(tag)?.[0].toUpperCase() ?? '';
  if (/^F(T|I|IT)$/.test(letters)) return 'flow';
  if (/^Z(T|I|IT)$/.test(letters)) return 'position';
  if (/^D(T|I|IT)$/.test(letters)) return 'density';
  return null;
}
