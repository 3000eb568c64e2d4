import { once } from 'node:events';
import { createServer, type Server } from 'node:http';
import { type AddressInfo, connect } from 'node:net';
import express from 'express';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Problem, problemSchema } from '#server/contracts/common.ts';
import { requestLog } from '#server/http/log.ts';
import { problemHandler } from '#server/http/problem.ts';
import { readUpload, type Upload } from '#server/http/upload.ts';

const LIMIT = 50_000;
let server: Server;
let origin: string;
const received: Upload[] = [];
const errors: string[] = [];

beforeAll(async () => {
  const app = express();
  app.use(requestLog(pino({ level: 'error' }, { write: (line: string) => void errors.push(line) })));
  app.post('/', readUpload(LIMIT), (_request, response) => {
    received.push(response.locals['upload'] as Upload);
    response.json('taken');
  });
  app.use(problemHandler);
  server = createServer(app).listen(0, '127.0.0.1');
  await once(server, 'listening');
  origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
});
afterAll(async () => {
  server.close();
  await once(server, 'close');
});

const bytes = (length: number) => Uint8Array.from({ length }, (_, i) => i % 251);
function form(...parts: [field: string, value: Uint8Array<ArrayBuffer> | string, name?: string][]): FormData {
  const data = new FormData();
  for (const [field, value, name] of parts) {
    if (typeof value === 'string') data.append(field, value);
    else data.append(field, new Blob([value]), name);
  }
  return data;
}
async function refused(body: BodyInit, headers: Record<string, string> = {}): Promise<Problem> {
  const before = received.length;
  const response = await fetch(origin, { method: 'POST', body, headers });
  expect(response.headers.get('content-type')).toMatch(/^application\/problem\+json/);
  expect(received).toHaveLength(before);
  expect(errors).toEqual([]);
  const problem = problemSchema.parse(await response.json());
  expect(problem.status).toBe(response.status);
  return problem;
}

describe('an upload', () => {
  it('is taken byte for byte, with the last part of its name', async () => {
    const sent = bytes(LIMIT);
    const response = await fetch(origin, {
      method: 'POST',
      body: form(['file', sent, '../a/Rippe 3 – übergroß.jpg']),
    });
    expect(response.status).toBe(200);
    const upload = received.at(-1)!;
    expect(upload.fileName).toBe('Rippe 3 – übergroß.jpg');
    expect(Buffer.compare(upload.bytes, sent)).toBe(0);
  });

  it.each([
    ['C:\\photos\\left 2.png', 'left 2.png'],
    ['two\r\nlines\u2028.png', 'twolines.png'],
    ['x'.repeat(300), 'x'.repeat(200)],
  ])('named %j is called %j', async (name, expected) => {
    await fetch(origin, { method: 'POST', body: form(['file', bytes(3), name]) });
    expect(received.at(-1)?.fileName).toBe(expected);
  });

  const one = bytes(10);
  it.each([
    ['no file', form(), 'Choose a file.'],
    ['an empty file', form(['file', bytes(0), 'a.png']), 'The file is empty.'],
    ['another field', form(['photo', one, 'a.png']), /^Send one file/],
    ['two files', form(['file', one, 'a.png'], ['file', one, 'b.png']), /^Send one file/],
    ['text beside it', form(['file', one, 'a.png'], ['note', 'x']), /^Send one file/],
    ['text in its place', form(['file', 'not a file']), /^Send one file/],
  ])('is refused with the field named: %s', async (_name, body, message) => {
    const problem = await refused(body);
    expect([problem.status, problem.errors?.map(({ path }) => path)]).toEqual([422, ['file']]);
    expect(problem.errors?.[0]?.message).toMatch(message);
  });

  it('is too large by one byte, and when it says so beforehand', async () => {
    for (const length of [LIMIT + 1, 40 * LIMIT]) {
      const problem = await refused(form(['file', bytes(length), 'a.png']));
      expect([problem.status, problem.code]).toEqual([413, 'too-large']);
      expect(problem.detail).toBe('A file may have at most 0.05 MB.');
    }
  });

  it('is too large although it does not say its length', async () => {
    const chunk = bytes(LIMIT);
    const body = new ReadableStream({
      start(controller) {
        controller.enqueue(
          Buffer.from(
            '--b\r\nContent-Disposition: form-data; name="file"; filename="a"\r\nContent-Type: image/png\r\n\r\n',
          ),
        );
        for (let i = 0; i < 4; i += 1) controller.enqueue(chunk);
        controller.close();
      },
    });
    const response = await fetch(origin, {
      method: 'POST',
      body,
      headers: { 'content-type': 'multipart/form-data; boundary=b' },
      duplex: 'half',
    } as RequestInit);
    expect(response.status).toBe(413);
  });

  it.each([
    ['JSON', '{}', 'application/json', 415],
    ['bare bytes', bytes(9), 'image/png', 415],
    ['a plain form', 'file=1', 'application/x-www-form-urlencoded', 415],
    ['no boundary', '--b', 'multipart/form-data', 400],
    [
      'a body that breaks off',
      '--b\r\nContent-Disposition: form-data; name="file"; filename="a"\r\n\r\nhalf',
      'multipart/form-data; boundary=b',
      400,
    ],
    ['no parts at all', 'nonsense', 'multipart/form-data; boundary=b', 400],
  ] as [string, BodyInit, string, number][])('is refused as %s', async (_name, body, type, status) => {
    expect((await refused(body, { 'content-type': type })).status).toBe(status);
  });

  it('that is broken off on the way is forgotten', async () => {
    const before = received.length;
    const socket = connect(Number(new URL(origin).port), '127.0.0.1');
    socket.write(
      'POST / HTTP/1.1\r\nHost: x\r\nContent-Type: multipart/form-data; boundary=b\r\nContent-Length: 4000\r\n\r\n' +
        '--b\r\nContent-Disposition: form-data; name="file"; filename="a"\r\n\r\nhalf',
    );
    await once(socket, 'connect');
    socket.destroy();
    await once(socket, 'close');
    const response = await fetch(origin, { method: 'POST', body: form(['file', bytes(5), 'next.png']) });
    expect(response.status).toBe(200);
    expect(received).toHaveLength(before + 1);
    expect(errors).toEqual([]);
  });
});
