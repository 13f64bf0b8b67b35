import type { IncomingMessage } from 'node:http';
import type { H3Event } from 'h3';
import { problem } from './problem';

/** Most of a body that is kept, bytes: a spec with every field filled in has under 2 kB. */
const MOST_BYTES = 64 * 1024;

/** Most that is read and thrown away, bytes, so that a sender still writing gets our answer and not a reset. */
const MOST_DISCARDED = 1024 * 1024;

const tooLarge = () => problem(413, `The body is larger than ${MOST_BYTES / 1024} kB.`, { headers: { connection: 'close' } });

/** The bytes of a request, never more than MOST_BYTES of them held, whether or not a length was announced. */
async function readBytes(request: IncomingMessage): Promise<Buffer> {
  if (Number(request.headers['content-length'] ?? 0) > MOST_DISCARDED) throw tooLarge();
  let chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of request.iterator({ destroyOnReturn: false }) as AsyncIterable<Buffer>) {
    size += chunk.length;
    if (size > MOST_DISCARDED) break;
    if (size > MOST_BYTES) chunks = [];
    else chunks.push(chunk);
  }
  if (size > MOST_BYTES) throw tooLarge();
  const [only] = chunks;
  return chunks.length === 1 && only ? only : Buffer.concat(chunks);
}

const utf8 = new TextDecoder('utf-8', { fatal: true });

/** The body as text; JSON is UTF-8 (RFC 8259, 8.1). */
export async function readText(event: H3Event): Promise<string> {
  const request = event.node.req;
  let bytes: Buffer;
  try {
    bytes = await readBytes(request);
  } catch (error) {
    if (request.destroyed && !request.complete) throw problem(400, 'The connection closed before the whole body came.');
    throw error;
  }
  try {
    return utf8.decode(bytes);
  } catch {
    throw problem(400, 'The body is not UTF-8 text.');
  }
}
