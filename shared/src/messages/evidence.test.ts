import { describe, expect, it } from 'vitest';
import { evidenceInWords } from './evidence.js';

const written = (evidence: Record<string, number | null>) =>
  evidenceInWords(evidence).map(({ name, figure }) => `${name}: ${figure.replaceAll('\u00a0', ' ')}`);

describe('evidenceInWords', () => {
  it('gives shares, travels, times and changes in the unit a reader expects', () => {
    expect(written({ belowLow: 0.31, p95: 23.44, period: 95, change: Math.log(0.92) })).toEqual([
      'time below the band: 31 %',
      '95 % of the time below: 23.4 %',
      'period: 95 s',
      'change of capacity: −8.0 %',
    ]);
  });

  it('leaves out what is not known, and instants', () => {
    expect(written({ p95: null, gainAtMedian: NaN, at: 1_760_000_000 })).toEqual([]);
  });

  it('writes a name it does not know as words', () => {
    expect(written({ newFigure: 3 })).toEqual(['new figure: 3']);
  });
});
