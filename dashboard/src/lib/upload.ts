import { problemFrom, unreachable } from './problem-error';
import { accessToken, refreshSession } from './session';

interface Upload {
  /** share sent, 0 to 1 */
  readonly onProgress: (share: number) => void;
  readonly signal?: AbortSignal;
}

/**
 * Sends a form with a file, telling how far it is: fetch cannot say, so this is an XMLHttpRequest.
 *
 * @throws ProblemError where the API says no; Error where it was not reached; an AbortError where it was stopped
 */
export async function upload<T>(path: string, form: FormData, { onProgress, signal }: Upload): Promise<T> {
  // A token that ran out would be noticed only after the whole file was sent.
  await refreshSession();
  return new Promise<T>((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', `/api${path}`);
    request.setRequestHeader('Accept', 'application/json');
    request.setRequestHeader('Authorization', `Bearer ${accessToken()}`);
    request.upload.onprogress = ({ loaded, total }) => onProgress(total > 0 ? loaded / total : 0);
    request.onload = () =>
      request.status < 300
        ? resolve(JSON.parse(request.responseText) as T)
        : reject(problemFrom(request.status, request.responseText));
    request.onerror = () => reject(unreachable(null));
    request.onabort = () => reject(new DOMException('Stopped', 'AbortError'));
    signal?.addEventListener('abort', () => request.abort());
    request.send(form);
  });
}
