import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { type Response } from 'express';
import { type StreamedFile } from '@/shared/contract/define-endpoint';

/**
 * Sends a file while it is made, no faster than the reader takes it. Once its first piece is out a failure can only cut the
 * connection: a file that merely ended would look whole.
 */
export async function sendFile(response: Response, file: unknown): Promise<void> {
  const { fileName, contentType, pieces } = file as StreamedFile; // what the endpoint's handler gives by its type
  const source = pieces[Symbol.asyncIterator]();
  const first = await source.next(); // what fails before there is anything to send is answered like any other failure
  response.status(200).set({
    'Content-Type': contentType,
    'Content-Disposition': `attachment; filename="${fileName}"`,
  });
  await pipeline(
    Readable.from(
      (async function* () {
        if (first.done !== true) yield first.value;
        yield* { [Symbol.asyncIterator]: () => source };
      })(),
    ),
    response,
  );
}
