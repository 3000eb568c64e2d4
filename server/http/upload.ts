import { type RequestHandler } from 'express';
import multer, { memoryStorage, MulterError } from 'multer';
import { Refusal, refuseField } from '#server/refusal.ts';

/** A file as it came in, held in memory; name and content are the sender's and are trusted in nothing. */
export interface Upload {
  readonly bytes: Buffer;
  /** The last part of the name, one line; empty when it had none. */
  readonly fileName: string;
}

const FIELD = 'file';
/** What a multipart body may hold beside the bytes of its file. */
const AROUND_BYTES = 16_384;
const LONGEST_NAME = 200;

function tooLarge(maxBytes: number): Refusal {
  return new Refusal('too-large', { detail: `A file may have at most ${maxBytes / 1e6} MB.` });
}

/** What multer and the parser beneath it throw, in our own terms. */
function refusalOf(error: unknown, maxBytes: number): Refusal {
  if (!(error instanceof MulterError)) return new Refusal('malformed');
  if (error.code === 'LIMIT_FILE_SIZE') return tooLarge(maxBytes);
  return refuseField(FIELD, `Send one file in the field “${FIELD}”, and nothing else.`);
}

function nameOf(original: string): string {
  return original
    .replace(/^.*[\\/]/s, '')
    .replace(/[\p{Cc}\p{Zl}\p{Zp}]/gu, '')
    .slice(0, LONGEST_NAME);
}

/**
 * Reads one file of a multipart body into memory; `response.locals.upload` then holds it as {@link Upload}. It comes behind the
 * guard, so that nobody without the permission makes the server read anything.
 *
 * @throws Refusal `unsupported-type` when the body is not multipart/form-data, `too-large`, `malformed`, or `invalid` naming `file`
 *   when there is none, an empty one, or more than that
 */
export function readUpload(maxBytes: number): RequestHandler {
  const read = multer({
    storage: memoryStorage(),
    defParamCharset: 'utf8',
    limits: { fileSize: maxBytes, files: 1, fields: 0, parts: 1, fieldNameSize: 100, headerPairs: 20 },
  }).single(FIELD);
  return (request, response, next) => {
    if (request.is('multipart/form-data') === false) throw new Refusal('unsupported-type');
    if (Number(request.get('content-length') ?? 0) > maxBytes + AROUND_BYTES) throw tooLarge(maxBytes);
    read(request, response, (error: unknown) => {
      if (error) return next(refusalOf(error, maxBytes));
      const { file } = request;
      if (!file) return next(refuseField(FIELD, 'Choose a file.'));
      if (file.size === 0) return next(refuseField(FIELD, 'The file is empty.'));
      response.locals['upload'] = {
        bytes: file.buffer,
        fileName: nameOf(file.originalname),
      } satisfies Upload;
      next();
    });
  };
}
