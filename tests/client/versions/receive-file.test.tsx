import { describe, expect, it, vi } from 'vitest';
import { OfflineError, ProblemError } from '#client/api/request.ts';
import { announcedChecksum, ChecksumError, receiveFile } from '#client/versions/receive-file.ts';
import { fakeServer, problem } from './support.tsx';

const text = 'Heron outer panel v3\n1.000000 0.001260\n';
const path = '/contour.dat';

async function sha256(of: string): Promise<string> {
  return Buffer.from(await crypto.subtle.digest('SHA-256', new TextEncoder().encode(of))).toString('hex');
}

function fileAnswer(checksum: string | null): Response {
  return new Response(text, {
    headers: {
      'content-type': 'text/plain; charset=utf-8',
      'content-disposition': 'attachment; filename="heron_v3_unit.dat"',
      'content-length': String(text.length),
      ...(checksum === null ? {} : { 'x-checksum-sha256': checksum }),
    },
  });
}

describe('receiveFile', () => {
  it('hands over the bytes under the name the server gave, checked against its checksum', async () => {
    const checksum = await sha256(text);
    fakeServer({ [`GET ${path}`]: () => fileAnswer(checksum) });
    const onProgress = vi.fn();
    const file = await receiveFile(path, { onProgress });
    expect(new TextDecoder().decode(file.bytes)).toBe(text);
    expect(file).toMatchObject({
      fileName: 'heron_v3_unit.dat',
      mediaType: 'text/plain; charset=utf-8',
      checksum,
      verified: true,
    });
    expect(onProgress).toHaveBeenLastCalledWith(text.length, text.length);
  });

  it('refuses bytes that are not those the server announced', async () => {
    fakeServer({ [`GET ${path}`]: () => fileAnswer('0'.repeat(64)) });
    await expect(receiveFile(path)).rejects.toBeInstanceOf(ChecksumError);
  });

  it('says that nothing was checked where the browser cannot hash', async () => {
    vi.stubGlobal('crypto', {});
    fakeServer({ [`GET ${path}`]: () => fileAnswer('0'.repeat(64)) });
    expect(await receiveFile(path)).toMatchObject({ verified: false, checksum: '0'.repeat(64) });
  });

  it('says that nothing was checked where the server announces no checksum', async () => {
    fakeServer({ [`GET ${path}`]: () => fileAnswer(null) });
    expect(await receiveFile(path)).toMatchObject({ verified: false, checksum: null });
  });

  it('passes a refusal on, and tells it from no answer', async () => {
    fakeServer({ [`GET ${path}`]: () => problem(422, 'The chord must be a number.') });
    await expect(receiveFile(path)).rejects.toBeInstanceOf(ProblemError);
    fakeServer({ [`GET ${path}`]: () => Promise.reject(new TypeError('no network')) });
    await expect(receiveFile(path)).rejects.toBeInstanceOf(OfflineError);
  });

  it('counts a connection that breaks on the way as no answer', async () => {
    const broken = new ReadableStream({
      pull: (controller) => {
        controller.error(new TypeError('reset'));
      },
    });
    fakeServer({ [`GET ${path}`]: () => new Response(broken) });
    await expect(receiveFile(path)).rejects.toBeInstanceOf(OfflineError);
  });
});

describe('announcedChecksum', () => {
  it('asks for the head only', async () => {
    const requests = fakeServer({ [`HEAD ${path}`]: () => fileAnswer('c'.repeat(64)) });
    expect(await announcedChecksum(path)).toBe('c'.repeat(64));
    expect(requests.map(({ method }) => method)).toEqual(['HEAD']);
  });
});
