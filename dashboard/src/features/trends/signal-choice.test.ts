import { type TrendLook } from '@tailrace/shared/contracts/trends';
import { expect, test } from 'vitest';
import { bindingsOf, choiceFor, countChoices, troubleWith } from './signal-choice';

type Tag = TrendLook['tags'][number];
const valveId = '1c1f6c1e-2f0c-4d7e-9a55-0d6f3a1c1001';
const aTag = (historianTag: string, of: Partial<Tag> = {}): Tag => ({
  historianTag,
  unit: null,
  examples: [],
  bound: [],
  proposal: null,
  ...of,
});
const proposed = aTag('FV-1.ZT', { unit: '%', proposal: { valveId, valveTag: 'FV-1', role: 'position' } });

test('a proposal stands until a person chooses otherwise', () => {
  expect(bindingsOf([proposed], {})).toEqual([
    { historianTag: 'FV-1.ZT', valveId, role: 'position', unit: '%', reversed: false },
  ]);
  const left = { ...choiceFor(proposed, {}), valve: null };
  expect(bindingsOf([proposed], { 'FV-1.ZT': left })).toEqual([]);
});

test('a tag that is bound already is taken without being bound again', () => {
  const bound = aTag('FT-1', { bound: [{ valveTag: 'FV-1', role: 'flow', unit: 'm3/h' }] });
  expect(bindingsOf([bound], {})).toEqual([]);
  expect(countChoices([bound, proposed, aTag('XX')], {})).toEqual({ bound: 1, newly: 1, left: 1 });
});

test('a valve without a signal is trouble, and names the tag', () => {
  const half = { ...choiceFor(aTag('TT-5'), {}), valve: { id: valveId, tag: 'FV-1' } };
  expect(troubleWith([aTag('TT-5')], { 'TT-5': half })).toContain('TT-5');
});

test('two tags for the same signal of one valve are trouble', () => {
  const twin = aTag('FV-1.ZT2', { proposal: proposed.proposal });
  expect(troubleWith([proposed], {})).toBeNull();
  expect(troubleWith([proposed, twin], {})).toContain('FV-1.ZT2');
});

test('an empty unit is no unit', () => {
  const choice = { ...choiceFor(proposed, {}), unit: '  ' };
  expect(bindingsOf([proposed], { 'FV-1.ZT': choice })[0]?.unit).toBeNull();
});
