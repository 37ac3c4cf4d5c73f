import { Worker } from 'node:worker_threads';
import { type PriceFileContent } from '@/server/prices/reading/interpret-table';
import { PriceFileError } from '@/server/prices/reading/price-file-error';
import { readPriceFile, type PriceFileRequest } from '@/server/prices/reading/read-price-file';
import { type WorkerAnswer } from '@/server/prices/reading/worker-answer';

/** What one file may take of the machine. */
export const fenceLimits = { heapMegabytes: 256, youngHeapMegabytes: 32, timeMs: 30_000 } as const;
type FenceLimits = { readonly [K in keyof typeof fenceLimits]: number };

/** Text up to this size is read where it is: starting a thread would take longer than reading. */
const readInPlaceBytes = 256 * 1024;

/** The worker beside this file: TypeScript while developing and testing, bundled in production. */
function workerFile(): { file: URL; execArgv: string[]; env: Record<string, string> } {
  if (!import.meta.url.endsWith('.ts')) {
    return { file: new URL('./prices/reading/price-file-worker.js', import.meta.url), execArgv: [], env: {} };
  }
  return {
    file: new URL('./reading/price-file-worker.ts', import.meta.url),
    execArgv: ['--require', 'tsx/cjs'], // its --import form does not reach the first file of a thread
    env: { TSX_TSCONFIG_PATH: new URL('../tsconfig.json', import.meta.url).pathname },
  };
}

const tooDemanding = (what: string) =>
  new PriceFileError('too-large', `Reading the file takes more than ${what}. Save the prices alone as CSV.`);

/** Reads a file in a thread with a memory and a time limit; the thread's death refuses the file and harms nothing else. */
export function readInThread(request: PriceFileRequest, limits: FenceLimits = fenceLimits): Promise<PriceFileContent> {
  const { file, execArgv, env } = workerFile();
  return new Promise((resolve, reject) => {
    const worker = new Worker(file, {
      execArgv,
      env, // none of the server's own
      resourceLimits: {
        maxOldGenerationSizeMb: limits.heapMegabytes,
        maxYoungGenerationSizeMb: limits.youngHeapMegabytes,
      },
    });
    const settle = (act: () => void) => {
      clearTimeout(timer);
      worker.removeAllListeners();
      worker.on('error', () => undefined); // a thread that is ended may still report its end
      act();
      void worker.terminate();
    };
    const timer = setTimeout(() => {
      settle(() => reject(tooDemanding(`${limits.timeMs / 1000} seconds`)));
    }, limits.timeMs);
    worker.once('message', (answer: WorkerAnswer) => {
      settle(() => {
        if (answer.kind === 'content') resolve(answer.content);
        else reject(new PriceFileError(answer.code, answer.message));
      });
    });
    worker.once('error', (error: Error & { code?: string }) => {
      const isOutOfMemory = error.code === 'ERR_WORKER_OUT_OF_MEMORY';
      settle(() => reject(isOutOfMemory ? tooDemanding(`${limits.heapMegabytes} MB of memory`) : error));
    });
    worker.once('exit', (code) => {
      settle(() => reject(new Error(`The thread that reads price files ended with ${code} and no answer.`)));
    });
    worker.postMessage(request);
  });
}

/** Reads a price file behind a fence where it is large or packed. */
export const readPriceFileFenced = (request: PriceFileRequest): Promise<PriceFileContent> => {
  const isPacked = request.bytes[0] === 0x50 && request.bytes[1] === 0x4b;
  return isPacked || request.bytes.length > readInPlaceBytes ? readInThread(request) : readPriceFile(request);
};
