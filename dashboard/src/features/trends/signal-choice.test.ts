import { type TrendLook } from '@tailrace/shared/contracts/trends';
import { describe, expect, it } from 'vitest';
import { bindingsOf, countChoices, troubleWith } from './signal-choice';

type SeenTag = TrendLook['tags'][number];

const valve = { valveId: '7a1f6c1e-2f0c-4d7e-9a55-0d6f3a1c0001', valveTag: 'FV-2101' };

function aTag(historianTag: string, of: Partial<SeenTag> = {}): SeenTag {
  return { historianTag, unit: null, examples: [], bound: [], proposal: null, ...of };
}
const proposed = aTag('FV-2101.OP', { unit: '%', proposal: { ...valve, role: 'demand' } });
const boundBefore = aTag('FT-2101', { bound: [{ valveTag: 'FV-2101', role: 'flow', unit: 't/h' }] });
const unknown = aTag('XX.9');

describe('signals of a trend file', () => {
  it('binds what is proposed unless a person chooses otherwise', () => {
    expect(bindingsOf([proposed, boundBefore, unknown], {})).toEqual([
      { historianTag: 'FV-2101.OP', valveId: valve.valveId, role: 'demand', unit: '%', reversed: false },
    ]);
    const left = { valve: null, role: null, unit: '', reversed: false };
    expect(bindingsOf([proposed], { 'FV-2101.OP': left })).toEqual([]);
  });

  it('counts a tag bound before as taken, and one without a valve as left in the file', () => {
    expect(countChoices([proposed, boundBefore, unknown], {})).toEqual({ bound: 1, newly: 1, left: 1 });
  });

  it('sends an empty unit as none', () => {
    const chosen = {
      valve: { id: valve.valveId, tag: 'FV-2101' },
      role: 'flow',
      unit: ' ',
      reversed: true,
    } as const;
    expect(bindingsOf([unknown], { 'XX.9': chosen })[0]).toMatchObject({ unit: null, reversed: true });
  });

  it('asks which signal it is when only the valve was chosen', () => {
    const chosen = { valve: { id: valve.valveId, tag: 'FV-2101' }, role: null, unit: '', reversed: false };
    expect(troubleWith([unknown], { 'XX.9': chosen })).toContain('XX.9');
  });

  it('will not bind two tags to one signal of one valve', () => {
    const again = aTag('FV-2101.OP2', { proposal: { ...valve, role: 'demand' } });
    expect(troubleWith([proposed, again], {})).toContain('FV-2101.OP2');
    expect(troubleWith([proposed], {})).toBeNull();
  });
});
