import { createHash } from 'node:crypto';
import { type Request, type Response } from 'express';
import { type FileReply, type ServedFile } from './handlers.ts';

/** Whether the caller names this very content in If-None-Match, whatever it says about caches on the way (RFC 9110, 13.1.2). */
function hasAlready(request: Request, checksum: string): boolean {
  const tags = (request.get('if-none-match') ?? '').split(',').map((tag) => tag.trim().replace(/^W\//, ''));
  return tags.includes('*') || tags.includes(`"${checksum}"`);
}

function bytesOf(file: ServedFile): Buffer {
  return 'text' in file ? Buffer.from(file.text, 'utf8') : Buffer.from(file.bytes);
}

/**
 * Sends a file with its name, type and sum. The entity tag is the SHA-256 of the very bytes, which must therefore
 * reach the machine as they are: no compression on the way. What is still the same is answered with 304; that and HEAD
 * hand out no bytes and are not recorded.
 */
export async function sendFile(request: Request, response: Response, reply: FileReply): Promise<void> {
  const { file } = reply;
  const bytes = bytesOf(file);
  const checksum = createHash('sha256').update(bytes).digest('hex');
  if (reply.inline) response.set('Content-Disposition', 'inline');
  else response.attachment(file.fileName);
  response.set({
    'Content-Type': file.mediaType,
    'Cache-Control': 'private, no-cache, no-transform',
    ETag: `"${checksum}"`,
    'X-Checksum-Sha256': checksum,
  });
  if (hasAlready(request, checksum)) return void response.status(304).end();
  response.set('Content-Length', String(bytes.length));
  if (request.method === 'HEAD') return void response.end();
  await reply.record?.(checksum);
  response.end(bytes);
}
