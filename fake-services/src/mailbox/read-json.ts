import type { IncomingMessage } from 'node:http';
import { HttpError } from './http-answers.js';

const largestBodyBytes = 64 * 1024;

/**
 * Reads a JSON body. The content type is asked for because a page of another site cannot send it unasked.
 * @throws HttpError 415, 413 or 400
 */
export async function readJson(request: IncomingMessage): Promise<unknown> {
  if (!request.headers['content-type']?.toLowerCase().startsWith('application/json')) {
    throw new HttpError(415, 'not-json', 'Send the body as application/json.');
  }
  const chunks: Buffer[] = [];
  let sizeBytes = 0;
  for await (const chunk of request as AsyncIterable<Buffer>) {
    sizeBytes += chunk.length;
    if (sizeBytes > largestBodyBytes) throw new HttpError(413, 'too-large', 'The body is larger than 64 kB.');
    chunks.push(chunk);
  }
  try {
    return JSON.parse(Buffer.concat(chunks).toString('utf8'));
  } catch {
    throw new HttpError(400, 'not-json', 'The body is not JSON.');
  }
}
