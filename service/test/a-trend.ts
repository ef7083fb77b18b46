/** What a made record holds, and where the loop keeps its valve. */
export interface TrendShape {
  readonly tag: string;
  readonly days?: number;
  /** days after 4 May 2026 at which the record begins */
  readonly after?: number;
  /** s between rows */
  readonly step?: number;
  /** % travel */
  readonly band?: readonly [low: number, high: number];
}

const start = Date.UTC(2026, 4, 4);

/**
 * Position, flow and both pressures of a loop that rests ten minutes at each of many travels of its band, as a wide
 * CSV with the tags of `aValve`: water at 1 bar of pressure drop through an equal-percentage trim of rangeability 50
 * and Kv 60, with a little noise that is the same at every run.
 */
export function aTrend({
  tag,
  days = 3,
  after = 0,
  step = 30,
  band: [low, high] = [20, 80],
}: TrendShape): string {
  const noise = seeded(7 + after);
  const lines = [`Time,${tag}.ZT [%],${tag}.FT [m3/h],${tag}.P1 [kPa],${tag}.P2 [kPa]`];
  for (let second = 0; second < days * 86_400; second += step) {
    const share = ((Math.floor(second / 600) * 37) % 61) / 60;
    const travel = low + (high - low) * share + 0.1 * noise();
    const flow = 60 * 50 ** (travel / 100 - 1) * (1 + 0.005 * noise());
    const time = new Date(start + (after * 86_400 + second) * 1000).toISOString();
    lines.push(`${time},${travel.toFixed(2)},${flow.toFixed(3)},600,500`);
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
