import { trendRefusals, type TrendRefusal } from '@tailrace/shared/messages/trend-refusals';

/** The file as a whole cannot be used; nothing of it is kept. */
export class Refusal extends Error {
  private constructor(
    readonly reason: TrendRefusal,
    sentence: string,
    options?: ErrorOptions,
  ) {
    super(sentence, options);
  }

  static because<R extends TrendRefusal>(
    reason: R,
    ...figures: Parameters<(typeof trendRefusals)[R]>
  ): Refusal {
    const sentence = trendRefusals[reason] as (...figures: unknown[]) => string;
    return new Refusal(reason, sentence(...figures));
  }
}
