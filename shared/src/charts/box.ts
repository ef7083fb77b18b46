/** Where a drawing lies, in px with y pointing down, as SVG and the PDF page both have it. */
export interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** One mark on an axis: its place in px, the value there and the text beside it. */
export interface Tick {
  readonly at: number;
  readonly value: number;
  readonly text: string;
}

/** A place in px. */
export interface Place {
  readonly x: number;
  readonly y: number;
}

export interface Size {
  readonly width: number;
  readonly height: number;
}

/** The usual place of a plot: room at the left for numbers, above for the axis title, below for both. */
export function plotBox({ width, height }: Size, foot = 36): Box {
  return { left: 46, right: width - 14, top: 26, bottom: height - foot };
}

/** Whole hundredths of a px are finer than any screen or printer and keep the paths short. */
export const pathDigits = 2;
