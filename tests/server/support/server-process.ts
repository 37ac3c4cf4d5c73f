import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { createServer } from 'node:net';
import path from 'node:path';
import { type TestDatabase } from '@/tests/server/support/test-database';

const root = path.resolve(__dirname, '../../..');

export interface ServerProcess {
  readonly child: ChildProcess;
  readonly origin: string;
  readonly output: () => string;
  /** The exit status; null when a signal ended it. */
  readonly ended: Promise<number | null>;
}

export interface ServerProcesses {
  /** Starts the built server in a process of its own; nothing of this process's settings reaches it. */
  readonly launch: (changes?: Readonly<Record<string, string>>) => Promise<ServerProcess>;
  /** The same, once it says that it can work; its clock starts at the instant, if one is given. */
  readonly launchReady: (options?: {
    at?: string;
    changes?: Readonly<Record<string, string>>;
  }) => Promise<ServerProcess>;
  readonly endAll: () => void;
}

export function serverProcesses(database: TestDatabase): ServerProcesses {
  const children = new Set<ChildProcess>();
  const start = async (nodeOptions: readonly string[], changes: Readonly<Record<string, string>>) => {
    const port = await freePort();
    const origin = `http://127.0.0.1:${port}`;
    const child = spawn(process.execPath, [...nodeOptions, path.join(root, 'build/server/index.js')], {
      cwd: root,
      stdio: ['ignore', 'pipe', 'pipe'],
      env: {
        PATH: process.env.PATH,
        TZ: 'UTC',
        NODE_ENV: 'test',
        PORT: String(port),
        PUBLIC_ORIGIN: origin,
        DATABASE_URL: database.applicationUrl,
        SESSION_SECRET: 'a session secret for tests, 32 and more',
        PASSWORD_PEPPER: 'a password pepper for tests, 32 and more',
        BCRYPT_COST: '4',
        OPEN_SIGN_UP: 'yes',
        WEB_ROOT: 'tests/server/support/web-root',
        ...changes,
      },
    });
    children.add(child);
    let output = '';
    child.stdout.on('data', (part: Buffer) => (output += part.toString()));
    child.stderr.on('data', (part: Buffer) => (output += part.toString()));
    const ended = once(child, 'close').then(([code]: (number | null)[]) => code ?? null);
    return { child, origin, output: () => output, ended };
  };
  return {
    launch: (changes = {}) => start([], changes),
    launchReady: async ({ at, changes = {} } = {}) => {
      const server = await (at === undefined
        ? start([], changes)
        : start(['--import', path.join(root, 'tests/server/support/start-clock-at.mjs')], {
            ...changes,
            TEST_CLOCK_STARTS_AT: at,
          }));
      await until(isReady(server.origin));
      return server;
    },
    endAll: () => {
      for (const child of children) child.kill('SIGKILL');
      children.clear();
    },
  };
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const address = server.address();
  await new Promise((resolve) => server.close(resolve));
  if (address === null || typeof address === 'string') throw new Error('A TCP server has a port.');
  return address.port;
}

/** Asks again and again until the answer is the wanted one. */
export async function until(isSo: () => Promise<boolean>): Promise<void> {
  while (!(await isSo())) await new Promise((resolve) => setImmediate(resolve));
}

/** The status of an answer on a connection of its own; 0 when there is none. */
export const statusOf = (address: string): Promise<number> =>
  fetch(address, { headers: { Connection: 'close' } }).then(
    ({ status }) => status,
    () => 0,
  );

const isReady = (origin: string) => () => statusOf(`${origin}/readyz`).then((status) => status === 200);
