/** A block in which the travel oscillates: points from…to of the column looked at, period in s. */
export interface OscillatingBlock {
  readonly from: number;
  readonly to: number;
  readonly period: number;
  readonly regularity: number;
  readonly amplitude: number;
}
