import { expect, test } from 'vitest';
import { askedBy, narrowed, viewOf } from './ranking-view';

const asked = (address: string) => askedBy(viewOf(new URLSearchParams(address)));

test('an address without anything asks for the first page of the ranked valves', () => {
  expect(asked('')).toMatchObject({ list: 'ranked', page: 0 });
});

test('an address names a finding, a criticality, words and a page counted from one', () => {
  expect(asked('kind=Lost+motion&criticality=high&q=feed&page=3')).toMatchObject({
    kind: 'Lost motion',
    criticality: 'high',
    q: 'feed',
    page: 2,
  });
});

test('what makes no sense in an address is left out instead of being refused', () => {
  const query = asked('list=all&kind=Rusty&criticality=7&page=-4&other=x');
  expect(query).toMatchObject({ list: 'ranked', page: 0 });
  expect(query.kind).toBeUndefined();
  expect(query.criticality).toBeUndefined();
});

test('the choice of list or page alone narrows nothing down', () => {
  expect(narrowed({ list: 'trip', page: '2' })).toBe(false);
  expect(narrowed({ q: 'feed' })).toBe(true);
});
