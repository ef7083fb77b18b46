import { byAttention, type Standing } from './rank.js';

const aValve = (tag: string, parts: Partial<Standing> = {}): Standing => ({
  tag,
  attention: 50,
  strongest: 0.5,
  criticality: 'normal',
  ...parts,
});
const order = (...valves: Standing[]) => valves.sort(byAttention).map(({ tag }) => tag);

describe('the order of the ranking', () => {
  it('puts the higher attention first', () => {
    expect(order(aValve('A', { attention: 20 }), aValve('B', { attention: 60 }))).toEqual(['B', 'A']);
  });

  it('compares attention at whole numbers, so that a hair does not move a valve', () => {
    const order1 = order(
      aValve('A', { attention: 46.4, strongest: 0.4 }),
      aValve('B', { attention: 45.6, strongest: 0.6 }),
    );
    expect(order1).toEqual(['B', 'A']);
  });

  it('breaks ties by the strongest finding, then criticality, then tag', () => {
    expect(
      order(
        aValve('FV-10'),
        aValve('FV-9'),
        aValve('TV-1', { criticality: 'high' }),
        aValve('LV-1', { strongest: 0.9, criticality: 'low' }),
      ),
    ).toEqual(['LV-1', 'TV-1', 'FV-9', 'FV-10']);
  });
});
