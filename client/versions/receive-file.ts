import { OfflineError, problemOf, send } from '#client/api/request.ts';
import { sha256 } from '#client/app/sha256.ts';

/** The bytes that arrived are not those the server announced; they must not reach a machine. */
export class ChecksumError extends Error {
  override name = 'ChecksumError';
  constructor(
    readonly announced: string,
    readonly received: string,
  ) {
    super('The file that arrived is not the one the server sent.');
  }
}

interface ReceivedFile {
  readonly bytes: Uint8Array<ArrayBuffer>;
  readonly fileName: string;
  readonly mediaType: string;
  /** sha-256 of the file as the server announced it, in hexadecimal, or null when it announced none. */
  readonly checksum: string | null;
  /** Whether the bytes were hashed here and agreed with `checksum`; false only where the browser cannot hash. */
  readonly verified: boolean;
}

interface ReceiveOptions {
  readonly signal?: AbortSignal;
  /** Called with bytes received so far and the announced total, null when the server gave none. */
  readonly onProgress?: (received: number, total: number | null) => void;
}

/**
 * Fetches one export file and checks its bytes against the sha-256 in the answer's header.
 * @throws ProblemError when the server refuses, OfflineError when no answer comes, ChecksumError when the bytes differ.
 */
export async function receiveFile(url: string, options: ReceiveOptions = {}): Promise<ReceivedFile> {
  const response = await ask(url, 'GET', options.signal);
  const bytes = await readAll(response, options.onProgress);
  const checksum = checksumOf(response);
  const received = await sha256(bytes);
  if (checksum !== null && received !== null && received !== checksum)
    throw new ChecksumError(checksum, received);
  return {
    bytes,
    fileName: fileNameOf(response) ?? 'contour',
    mediaType: response.headers.get('Content-Type') ?? 'application/octet-stream',
    checksum,
    verified: checksum !== null && received !== null,
  };
}

/** sha-256 of the file behind `url` without receiving it, as the server announces it. */
export async function announcedChecksum(url: string, signal?: AbortSignal): Promise<string | null> {
  return checksumOf(await ask(url, 'HEAD', signal));
}

async function ask(url: string, method: 'GET' | 'HEAD', signal?: AbortSignal): Promise<Response> {
  // Past the browser's cache: each file handed out is to be on the server's record.
  const response = await send(url, { method, cache: 'no-store', ...(signal ? { signal } : {}) });
  if (!response.ok) throw await problemOf(response);
  return response;
}

async function readAll(
  response: Response,
  onProgress: ReceiveOptions['onProgress'],
): Promise<Uint8Array<ArrayBuffer>> {
  const length = Number(response.headers.get('Content-Length') ?? Number.NaN);
  // A compressed answer announces the length of what travels, not of the file.
  const total = Number.isFinite(length) && !response.headers.has('Content-Encoding') ? length : null;
  if (!response.body) return new Uint8Array(await response.arrayBuffer());
  const chunks: Uint8Array[] = [];
  let received = 0;
  const reader = response.body.getReader();
  for (;;) {
    const { done, value } = await reader.read().catch((cause: unknown) => {
      throw new OfflineError({ cause });
    });
    if (done) break;
    chunks.push(value);
    received += value.byteLength;
    onProgress?.(received, total);
  }
  return joined(chunks, received);
}

function joined(chunks: readonly Uint8Array[], length: number): Uint8Array<ArrayBuffer> {
  const bytes = new Uint8Array(length);
  let offset = 0;
  for (const chunk of chunks) {
    bytes.set(chunk, offset);
    offset += chunk.byteLength;
  }
  return bytes;
}

function checksumOf(response: Response): string | null {
  const value = response.headers.get('X-Checksum-Sha256');
  return value !== null && /^[0-9a-f]{64}$/.test(value) ? value : null;
}

function fileNameOf(response: Response): string | null {
  return /filename="?([^";]+)"?/.exec(response.headers.get('Content-Disposition') ?? '')?.[1] ?? null;
}
