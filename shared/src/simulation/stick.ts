/** A stem that sticks: moves the demand has made and the stem has not. */
export interface Stem {
  /** % travel */
  position: number;
  residual: number;
  demand: number;
}

/**
 * One step of the two-parameter stick model: the stem moves once the demand accumulated since it rested exceeds
 * fS, and then falls short of it by fD. S = fS + fD is the stick band, J = fS − fD the jump; equal parameters are a
 * plain dead band.
 *
 * @param demand % travel
 * @returns true where the stem moved; `stem` holds the new state
 * Source: He, Wang, Pottmann, Qin (2007); methods.md §6.4
 */
export function moveStem(stem: Stem, demand: number, fS: number, fD: number): boolean {
  const accumulated = stem.residual + (demand - stem.demand);
  stem.demand = demand;
  if (Math.abs(accumulated) <= fS) {
    stem.residual = accumulated;
    return false;
  }
  const short = Math.sign(accumulated) * fD;
  stem.position = Math.min(100, Math.max(0, stem.position + accumulated - short));
  stem.residual = short;
  return true;
}
