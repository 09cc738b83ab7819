import type { Endpoint, ParamsOf, ResponseOf } from '../../server/contract/endpoint.ts';
import {
  ApiError,
  buildApiUrl,
  NetworkError,
  parseProblem,
  requireCsrfToken,
} from './api-client.ts';

interface UploadOptions<T extends Endpoint> {
  params: ParamsOf<T>;
  form: FormData;
  /** Share of the bytes sent so far, 0 to 1. */
  onProgress?: (share: number) => void;
  signal?: AbortSignal;
}

/** Sends a form with files; unlike `fetch`, it can say how far it got. Errors as `callApi`. */
export async function uploadForm<T extends Endpoint>(
  endpoint: T,
  { params, form, onProgress, signal }: UploadOptions<T>,
): Promise<ResponseOf<T>> {
  const token = await requireCsrfToken();
  const url = buildApiUrl(endpoint, { params: params as Record<string, unknown> });
  return new Promise<ResponseOf<T>>((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open(endpoint.method.toUpperCase(), url);
    request.setRequestHeader('X-CSRF-Token', token);
    request.setRequestHeader('Accept', 'application/json');
    request.upload.addEventListener('progress', (event) => {
      if (event.lengthComputable && event.total > 0) onProgress?.(event.loaded / event.total);
    });
    request.addEventListener('load', () => {
      if (request.status >= 200 && request.status < 300) {
        resolve(JSON.parse(request.responseText) as ResponseOf<T>);
      } else {
        reject(new ApiError(parseProblem(request.status, request.responseText)));
      }
    });
    request.addEventListener('error', () => reject(new NetworkError()));
    request.addEventListener('abort', () => reject(new DOMException('Stopped', 'AbortError')));
    signal?.addEventListener('abort', () => request.abort());
    request.send(form);
  });
}
