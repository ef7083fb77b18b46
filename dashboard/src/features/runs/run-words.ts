import { type AnalysisRun } from '@tailrace/shared/contracts/runs';

/** rows of a page of runs */
export const runsOfPage = 50;

/** Who or what set a run going. */
export function triggerInWords({
  trigger,
  requestedBy,
}: Pick<AnalysisRun, 'trigger' | 'requestedBy'>): string {
  if (trigger === 'schedule') return 'nightly schedule';
  if (trigger === 'seed') return 'first start';
  return requestedBy ?? 'a person';
}

/** Share of a run's valves that are finished, 0 to 1. */
export function shareFinished({ valves, judged, notJudged, failed }: AnalysisRun): number {
  return valves > 0 ? (judged + notJudged + failed) / valves : 0;
}
