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

/** Whole hundredths of a px are finer than any screen or printer and keep the paths short. */
export const pathDigits = 2;
