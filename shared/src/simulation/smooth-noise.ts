/** A normal deviate from uniform ones (Box and Muller 1958). */
export function normal(random: () => number): number {
  return Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
}

/** A first-order random walk about zero with unit sd and a correlation time, one step a call. */
export function wanderer(random: () => number, correlationSteps: number): () => number {
  const keep = Math.exp(-1 / correlationSteps);
  const add = Math.sqrt(1 - keep * keep);
  let value = normal(random);
  return () => (value = keep * value + add * normal(random));
}

/** A smooth departure over relative travel: a few slow waves with unit sd over 0 to 1. */
export function smoothDeparture(random: () => number): (h: number) => number {
  const waves = [0.8, 1.6, 2.6].map((cycles) => ({
    cycles,
    size: normal(random) / Math.sqrt(cycles),
    phase: 2 * Math.PI * random(),
  }));
  const norm = Math.sqrt(waves.reduce((sum, { size }) => sum + (size * size) / 2, 0)) || 1;
  return (h) =>
    waves.reduce(
      (sum, { cycles, size, phase }) => sum + size * Math.sin(2 * Math.PI * cycles * h + phase),
      0,
    ) / norm;
}
