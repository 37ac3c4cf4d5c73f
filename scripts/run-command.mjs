import { spawn, spawnSync } from 'node:child_process';
import { root } from './places.mjs';

/** Runs a command to its end with its output shown; throws when it fails. */
export function run(command, args, { env = {}, quiet = false, cwd = root } = {}) {
  const result = spawnSync(command, args, {
    cwd,
    env: { ...process.env, ...env },
    stdio: quiet ? ['ignore', 'pipe', 'pipe'] : ['ignore', 'inherit', 'inherit'],
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  if (result.error) throw result.error;
  if (result.status !== 0) {
    if (quiet) process.stderr.write(`${result.stdout ?? ''}${result.stderr ?? ''}`);
    throw new Error(`${command} ${args[0] ?? ''} ended with status ${result.status ?? result.signal}.`);
  }
  return result.stdout ?? '';
}

/** Whether a program can be found. */
export function isOnPath(program) {
  return spawnSync('sh', ['-c', `command -v ${program}`], { stdio: 'ignore' }).status === 0;
}

/** Starts a process in a group of its own, so that Ctrl-C reaches only the one who started it. */
export function startProcess(command, args, { env = {}, stdio = ['ignore', 'inherit', 'inherit'] } = {}) {
  const child = spawn(command, args, { cwd: root, env: { ...process.env, ...env }, stdio, detached: true });
  const ended = new Promise((resolve) => {
    child.once('exit', (code, signal) => resolve({ code, signal }));
    child.once('error', (error) => resolve({ code: 1, signal: null, error }));
  });
  return { pid: child.pid, child, ended };
}

export function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false; // ESRCH: there is no such process
  }
}

export const pause = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));

/** Waits until a condition holds; throws with `what` when it does not in time. */
export async function until(condition, what, milliseconds = 60_000) {
  const end = Date.now() + milliseconds;
  while (!(await condition())) {
    if (Date.now() > end) throw new Error(`${what} did not happen within ${milliseconds / 1000} s.`);
    await pause(100);
  }
}
