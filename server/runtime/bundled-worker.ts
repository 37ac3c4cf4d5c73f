/**
 * The file of a thread: bundled beside the server's bundle in production, and in the same place when the source runs by itself.
 * @param file under build/server, such as 'engine/engine-worker.js'.
 */
export function bundledWorker(file: string): URL {
  const isSource = import.meta.url.endsWith('.ts');
  return new URL(isSource ? `../../build/server/${file}` : `./${file}`, import.meta.url);
}
