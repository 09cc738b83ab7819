/** Uploads as a program without manners sends them: any name, any bytes, also half of them. */
import http from 'node:http';
import type { Visitor } from './app.ts';

export interface RawAnswer {
  status: number;
  body: {
    detail?: string;
    items?: {
      name: string;
      accepted: boolean;
      reason: string | null;
      scan: { id: string } | null;
    }[];
  };
}

const boundary = 'a-boundary-that-stands-in-no-file';

/** The parts of a multipart body; names go in as they are, save for the quote that would end them. */
export function composeUpload(files: { name: string; bytes: Buffer }[]): Buffer {
  const parts = files.flatMap(({ name, bytes }) => [
    Buffer.from(
      `--${boundary}\r\nContent-Disposition: form-data; name="files"; filename="${name.replaceAll('"', '%22')}"\r\n` +
        'Content-Type: application/octet-stream\r\n\r\n',
    ),
    bytes,
    Buffer.from('\r\n'),
  ]);
  return Buffer.concat([...parts, Buffer.from(`--${boundary}--\r\n`)]);
}

/** Opens an upload to a box; the caller writes the body, or a piece of it. */
export function openUpload(
  url: string,
  visitor: Visitor,
  boxId: string,
  length: number,
): { request: http.ClientRequest; answer: Promise<RawAnswer> } {
  const request = http.request(`${url}/api/boxes/${boxId}/scans`, {
    method: 'POST',
    headers: {
      cookie: visitor.cookie(),
      'x-csrf-token': visitor.csrfToken,
      'content-type': `multipart/form-data; boundary=${boundary}`,
      'content-length': length,
    },
  });
  const answer = new Promise<RawAnswer>((resolve, reject) => {
    request.on('error', reject);
    request.on('response', (response) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () =>
        resolve({
          status: response.statusCode ?? 0,
          body: JSON.parse(Buffer.concat(chunks).toString('utf8')) as RawAnswer['body'],
        }),
      );
    });
  });
  return { request, answer };
}

/** Sends whole files under whatever names. */
export function uploadRaw(
  url: string,
  visitor: Visitor,
  boxId: string,
  files: { name: string; bytes: Buffer }[],
): Promise<RawAnswer> {
  const body = composeUpload(files);
  const { request, answer } = openUpload(url, visitor, boxId, body.length);
  request.end(body);
  return answer;
}
