import { Problem } from './problem.js';

interface Issue {
  readonly message: string;
  readonly path?: readonly (PropertyKey | { readonly key: PropertyKey })[];
}

/** What a schema refused, each with the JSON pointer of its field, so that a form can show it in place. */
export function inputProblem(issues: readonly Issue[]): Problem {
  const errors = issues.map((issue) => ({ pointer: pointer(issue.path ?? []), detail: issue.message }));
  return new Problem('invalid-input', null, errors);
}

/** RFC 6901. */
function pointer(path: NonNullable<Issue['path']>): string {
  return path
    .map((part) => String(typeof part === 'object' ? part.key : part))
    .map((part) => `/${part.replaceAll('~', '~0').replaceAll('/', '~1')}`)
    .join('');
}
