import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { type Request, type RequestHandler, type Response } from 'express';
import multer, { MulterError } from 'multer';
import { ApiFailure } from '@/server/errors/api-failure';
import { type UploadedFile } from '@/server/http/handler';
import { priceFileLimits } from '@/shared/prices/price-upload-endpoints';

const receive = multer({
  storage: multer.diskStorage({
    destination: tmpdir(),
    filename: (_, __, done) => done(null, `brierbook-${randomUUID()}`),
  }),
  defParamCharset: 'utf8',
  limits: {
    fileSize: priceFileLimits.bytes,
    files: 1,
    parts: 1,
    fields: 0,
    fieldNameSize: 100,
    fieldSize: 0,
    headerPairs: 20,
  },
}).single('file');

/** Takes the one file of a request to disk; it is removed when the answer is out, however it ends. */
export const receiveFile: RequestHandler = (request, response, next) => {
  if (request.is('multipart/form-data') === false || request.is('multipart/form-data') === null) {
    next(new ApiFailure('content-type-refused', 'Send one file as multipart/form-data in the part "file".'));
    return;
  }
  receive(request, response, (error: unknown) => {
    response.once('close', () => void removeFile(request));
    next(error === undefined || error === null ? undefined : asFailure(error));
  });
};

async function removeFile(request: Request): Promise<void> {
  // When the request was refused half way, what is there of the file has no path: it was removed already.
  const path: string | undefined = request.file?.path;
  if (path !== undefined) await rm(path, { force: true });
}

function asFailure(error: unknown): unknown {
  // The parser's own errors (a body that ends half way) carry no code; those of the disk do.
  if (!(error instanceof MulterError) && (!(error instanceof Error) || 'code' in error)) return error;
  return error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE'
    ? new ApiFailure('too-large', `The file is larger than ${priceFileLimits.bytes / 1024 / 1024} MB.`)
    : new ApiFailure('request-malformed', 'Send exactly one file in the part "file".');
}

/** The received file. @throws {ApiFailure} `input-invalid` when there is none. */
export function fileOf(request: Request, _: Response): UploadedFile {
  const { file } = request;
  if (file === undefined)
    throw new ApiFailure('input-invalid', 'No file was chosen.', [{ field: 'file', message: 'Choose a file.' }]);
  return { path: file.path, originalName: file.originalname, sizeBytes: file.size };
}
