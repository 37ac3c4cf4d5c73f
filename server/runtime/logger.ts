import { pino, type DestinationStream, type Logger } from 'pino';

export type { Logger } from 'pino';

/** One JSON line an event, UTC; nothing a person typed and no secret goes into it. */
export function createLogger(level: string, destination?: DestinationStream): Logger {
  const options = {
    level,
    base: null,
    timestamp: () => `,"time":"${new Date().toISOString()}"`,
    redact: { paths: ['*.password', '*.token', 'req.headers.cookie', 'res.headers["set-cookie"]'], remove: true },
  };
  return destination === undefined ? pino(options) : pino(options, destination);
}
