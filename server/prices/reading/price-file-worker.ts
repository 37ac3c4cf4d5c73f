import { parentPort } from 'node:worker_threads';
import { PriceFileError } from '@/server/prices/reading/price-file-error';
import { readPriceFile, type PriceFileRequest } from '@/server/prices/reading/read-price-file';
import { type WorkerAnswer } from '@/server/prices/reading/worker-answer';

// A thread of its own: a hostile file can take its memory and time and nothing else.
parentPort?.once('message', (request: PriceFileRequest) => {
  readPriceFile(request).then(
    (content) => parentPort?.postMessage({ kind: 'content', content } satisfies WorkerAnswer),
    (error: unknown) => {
      if (!(error instanceof PriceFileError)) throw error; // ends the thread; the caller reports it
      parentPort?.postMessage({ kind: 'refused', code: error.code, message: error.message } satisfies WorkerAnswer);
    },
  );
});
