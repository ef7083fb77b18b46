/** One day of a valve's position and flow, as a wide CSV export with the tags of `aValve`. */
export interface TrendShape {
  readonly tag: string;
  readonly days?: number;
  /** s between rows */
  readonly step?: number;
}

const start = Date.UTC(2026, 4, 4);

/**
 * A loop that rests ten minutes at each of many travels between 20 and 80 %, behind an equal-percentage trim of
 * rangeability 50 and 60 m³/h wide open, with a little noise that is the same at every run.
 */
export function aTrend({ tag, days = 3, step = 30 }: TrendShape): string {
  const noise = seeded(7);
  const lines = [`Time,${tag}.ZT [%],${tag}.FT [m3/h]`];
  for (let second = 0; second < days * 86_400; second += step) {
    const rest = Math.floor(second / 600);
    const travel = 20 + ((rest * 37) % 61) + 0.1 * noise();
    const flow = 60 * 50 ** (travel / 100 - 1) * (1 + 0.005 * noise());
    const time = new Date(start + second * 1000).toISOString();
    lines.push(`${time},${travel.toFixed(2)},${flow.toFixed(3)}`);
  }
  return `${lines.join('\n')}\n`;
}

/** Numbers from −1 to 1 by a linear congruential generator (the constants of Numerical Recipes). */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 31 - 1;
  };
}
