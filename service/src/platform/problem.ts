import { type ProblemKind } from '@tailrace/shared/contracts/problems';
import { type ProblemDetail } from '@tailrace/shared/messages/problems';

export interface FieldProblem {
  /** JSON pointer of the field */
  readonly pointer: string;
  readonly detail: string;
}

/** A refusal that reaches the caller as problem details (RFC 9457). */
export class Problem extends Error {
  /**
   * @param kind decides status and title
   * @param detail which sentence explains it, or the sentence itself
   */
  constructor(
    readonly kind: ProblemKind,
    readonly detail: ProblemDetail | { readonly text: string } | null = null,
    readonly errors: readonly FieldProblem[] = [],
    options?: ErrorOptions,
  ) {
    super(
      `${kind}${detail === null ? '' : `: ${typeof detail === 'string' ? detail : detail.text}`}`,
      options,
    );
  }
}
