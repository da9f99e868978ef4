import type { Transport } from './send.ts';

/**
 * Carries an upload and tells how much of it has gone, 0–1: `fetch` cannot. Rejects as `fetch` does when there is no reply.
 */
export function withProgress(onProgress: (share: number) => void): Transport {
  return (url, init) =>
    new Promise((resolve, reject) => {
      const request = new XMLHttpRequest();
      request.open(init.method ?? 'POST', url);
      new Headers(init.headers).forEach((value, name) => request.setRequestHeader(name, value));
      request.upload.addEventListener('progress', ({ lengthComputable, loaded, total }) => {
        if (lengthComputable && total > 0) onProgress(loaded / total);
      });
      request.addEventListener('load', () => resolve(replyOf(request)));
      request.addEventListener('error', () => reject(new TypeError('No reply')));
      request.addEventListener('abort', () => reject(new DOMException('Given up', 'AbortError')));
      init.signal?.addEventListener('abort', () => request.abort());
      request.send(init.body as XMLHttpRequestBodyInit);
    });
}

function replyOf(request: XMLHttpRequest): Response {
  const type = request.getResponseHeader('content-type') ?? 'text/plain';
  return new Response(request.responseText, { status: request.status, headers: { 'content-type': type } });
}
