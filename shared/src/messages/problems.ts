import { type ProblemKind } from '../contracts/problems.js';

/** What the API says beside a problem's title: what, where, and how to mend it. */
const byKind: Record<ProblemKind, string> = {
  'invalid-input': 'Look at the fields named and send again.',
  'sign-in-failed': 'Check both and try again. After several wrong tries the sign-in rests for some minutes.',
  'not-signed-in': 'This needs a signed-in person. Sign in and try again.',
  'session-ended': 'Sign in again; nothing you have saved is lost.',
  'not-allowed': 'Ask a site administrator if you need it.',
  'not-found': 'It does not exist, or it lies outside your areas.',
  'already-exists': 'Open the one that is there instead.',
  'edited-meanwhile': 'Load it again, look at what changed, and make your change on top.',
  'wrong-state': 'Load it again to see where it stands.',
  'too-large': 'Send less at once.',
  'unusable-file': 'Mend the file and bring it in again; nothing of it was kept.',
  'upload-cut': 'The connection ended before the file was whole. Nothing was kept; send it again.',
  'too-many-requests': 'Wait a little and try again.',
  unexpected:
    'This is a fault of the service. It is in the log under the number given; tell your site administrator.',
  'not-ready': 'Try again in a moment.',
};

/** Finer sentences, where the kind's own would not say how to mend it. */
const details = {
  'tag-taken': 'A valve with this tag is in the register already. Use another tag, or open that valve.',
  'signal-bound':
    'This valve already has another tag for this role. An engineer can change it on the valve’s page.',
  'tag-elsewhere':
    'One of these historian tags belongs to a valve outside your areas. Somebody who sees both areas can bind it.',
  'no-such-route': 'There is no such address in the API. The list of them is at /api/docs.',
  'body-not-json': 'The body is not valid JSON.',
  'body-too-large': 'The body is larger than the 1 MB allowed here. Files go to /api/trends.',
  'area-not-yours': 'Choose one of your own areas.',
} as const;
export type ProblemDetail = keyof typeof details;

/** The sentence of a problem. */
export function problemSentence(kind: ProblemKind, detail: ProblemDetail | null = null): string {
  return detail === null ? byKind[kind] : details[detail];
}
