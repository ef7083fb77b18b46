import { type TakeInDraft, type TrendLook } from '@tailrace/shared/contracts/trends';
import { type SignalRole } from '@tailrace/shared/core/series';

/** What a person chose for one tag of a file: whose signal it is, or that it stays in the file. */
export interface SignalChoice {
  readonly valve: { readonly id: string; readonly tag: string } | null;
  readonly role: SignalRole | null;
  readonly unit: string;
  readonly reversed: boolean;
}
export type SignalChoices = Readonly<Record<string, SignalChoice>>;

type SeenTag = TrendLook['tags'][number];

/** What stands for a tag: what was chosen, or else what the service proposes. */
export function choiceFor(tag: SeenTag, chosen: SignalChoices): SignalChoice {
  return (
    chosen[tag.historianTag] ?? {
      valve: tag.proposal && { id: tag.proposal.valveId, tag: tag.proposal.valveTag },
      role: tag.proposal?.role ?? null,
      unit: tag.unit ?? '',
      reversed: false,
    }
  );
}

/** The new bindings among the choices. A tag that is bound already needs none. */
export function bindingsOf(tags: readonly SeenTag[], chosen: SignalChoices): TakeInDraft['bind'] {
  return tags.flatMap((tag) => {
    const { valve, role, unit, reversed } = choiceFor(tag, chosen);
    if (tag.bound.length > 0 || !valve || !role) return [];
    return [{ historianTag: tag.historianTag, valveId: valve.id, role, unit: unit.trim() || null, reversed }];
  });
}

/** How many tags will be taken, newly bound or bound before, and which stay in the file. */
export function countChoices(tags: readonly SeenTag[], chosen: SignalChoices) {
  const bound = tags.filter((tag) => tag.bound.length > 0).length;
  const newly = bindingsOf(tags, chosen).length;
  return { bound, newly, left: tags.length - bound - newly };
}

/** A valve chosen without a role, or a role twice for one valve: what must be mended before taking in. */
export function troubleWith(tags: readonly SeenTag[], chosen: SignalChoices): string | null {
  const halfway = tags.find((tag) => {
    const { valve, role } = choiceFor(tag, chosen);
    return tag.bound.length === 0 && valve && !role;
  });
  if (halfway) return `Say which signal ${halfway.historianTag} is, or leave it in the file.`;
  const taken = new Set<string>();
  for (const { valveId, role, historianTag } of bindingsOf(tags, chosen)) {
    const key = `${valveId} ${role}`;
    if (taken.has(key)) return `${historianTag} is the second tag for the same signal of one valve.`;
    taken.add(key);
  }
  return null;
}
