import { type RejectReason, type TakeInReport } from '@tailrace/shared/contracts/trends';

const linesKept = 20;

/** Rows and cells that could not be taken, counted by reason with the first lines and one example. */
export class Rejects {
  private readonly byReason = new Map<
    RejectReason,
    { count: number; firstLines: number[]; example: string }
  >();

  add(reason: RejectReason, line: number, example: string): void {
    const known = this.byReason.get(reason);
    if (!known) {
      this.byReason.set(reason, { count: 1, firstLines: [line], example: example.slice(0, 200) });
      return;
    }
    known.count += 1;
    if (known.firstLines.length < linesKept) known.firstLines.push(line);
  }

  report(): TakeInReport['rejects'] {
    return [...this.byReason].map(([reason, found]) => ({ reason, ...found }));
  }
}
