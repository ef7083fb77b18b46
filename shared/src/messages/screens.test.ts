import { describe, expect, test } from 'vitest';
import { findingKinds } from '../core/findings/kinds.js';
import {
  leftOutInWords,
  limitsInWords,
  rankingInWords,
  runInWords,
  severityInWords,
  takenInWords,
} from './screens.js';

const counts = { valves: 24, judged: 21, needAttention: 7, trips: 2, notJudged: 1 };

describe('the sentence above the ranking', () => {
  test('says how many valves, judged since when, how many need attention, and what is listed apart', () => {
    expect(rankingInWords(counts, '1 Sep 2026')).toBe(
      '24 valves in your areas, 21 judged on history since 1 Sep 2026; 7 need attention, 1 cannot be judged, 2 trip valves are listed apart.',
    );
  });

  test('speaks of one valve as of one', () => {
    expect(rankingInWords({ valves: 1, judged: 1, needAttention: 1, trips: 1, notJudged: 0 }, null)).toBe(
      '1 valve in your areas, all judged; 1 needs attention, 1 trip valve is listed apart.',
    );
  });

  test('says so where nothing needs attention, and where there is no valve', () => {
    expect(rankingInWords({ ...counts, needAttention: 0 }, null)).toContain('none needs attention');
    expect(rankingInWords({ ...counts, valves: 0 }, null)).toBe('No valves in your areas yet.');
  });
});

test('severity turns from worth a look to needs work half way to "act now"', () => {
  expect([0.2, 0.59, 0.6, 1].map(severityInWords)).toEqual([
    'worth a look',
    'worth a look',
    'needs work',
    'needs work',
  ]);
});

describe('a finding’s measure beside its limits', () => {
  const finding = { raise: 0.105, actNow: 0.35, standardError: null, rule: 'sheet' };

  test('a capacity lost is counted from what was specified, as in the finding’s own sentence', () => {
    const words = limitsInWords({ ...finding, kind: 'Lost capacity', x: -Math.log(0.81) });
    expect(words).toBe('measured 19\u00a0%; raised from 10\u00a0%, act now at 30\u00a0%');
  });

  test('a capacity gained is counted upward', () => {
    const words = limitsInWords({ ...finding, kind: 'Gained capacity', x: Math.log(1.25) });
    expect(words).toMatch(/^measured 25\u00a0%; raised from 11\u00a0%/);
  });

  test.each(findingKinds)('%s is written with a unit, never as a bare number', (kind) => {
    const words = limitsInWords({ ...finding, kind, x: 0.2, rule: 'some rule' });
    expect(words).toMatch(/^measured \S+(\u00a0| )(%|to 1|s|min|h|days)/);
  });
});

test('a run says what it finished, and names failures only where there are some', () => {
  expect(runInWords({ valves: 24, judged: 20, notJudged: 3, failed: 0 })).toBe(
    '23 of 24 valves finished, 20 judged, 3 cannot be judged.',
  );
  expect(runInWords({ valves: 24, judged: 20, notJudged: 3, failed: 1 })).toContain('1 failed');
});

test('taking in says rows, samples, bad ones and rejects', () => {
  expect(takenInWords({ rows: 1, samples: 12, badSamples: 3, rejected: 1 })).toBe(
    '1 row read, 12 samples taken, 3 of them marked bad; 1 reject is listed below.',
  );
  expect(takenInWords({ rows: 40_000, samples: 2, badSamples: 0, rejected: 0 })).toBe(
    '40\u202f000 rows read, 2 samples taken; nothing rejected.',
  );
});

test('a reason nobody gave words to is shown as it is', () => {
  expect(leftOutInWords('moon phase')).toBe('moon phase');
});
