// `npm start`: everything from a fresh clone to a running product; a second start takes seconds. Needs Node only.
import { rmSync, writeFileSync } from 'node:fs';
import { startDatabase } from './database.mjs';
import { ensurePackages } from './ensure-packages.mjs';
import { inRoot, varFolder } from './places.mjs';
import { run, startProcess, until } from './run-command.mjs';

const port = Number(process.env.PORT ?? 8080);
// Browsers take the host name for trustworthy, so that the session cookie may be Secure without TLS.
const origin = `http://localhost:${port}`;

ensurePackages();
const { buildServer } = await import('./build-server.mjs');
const { buildWeb } = await import('./build-web.mjs');

let database = null;
let server = null;
let isStopping = false;

async function stop(status) {
  if (isStopping) return;
  isStopping = true;
  if (server !== null) {
    server.child.kill('SIGTERM');
    await server.ended;
  }
  if (database !== null) await database.stop();
  process.exit(status);
}
process.on('SIGINT', () => void stop(0));
process.on('SIGTERM', () => void stop(0));

try {
  database = await startDatabase('main');
  const databaseUrl = database.applicationUrl('brierbook');
  writeFileSync(`${varFolder('main')}/database-url`, databaseUrl, { mode: 0o600 });
  rmSync(inRoot('build'), { recursive: true, force: true });
  await buildServer();
  buildWeb();

  const env = {
    NODE_ENV: 'development',
    TZ: 'UTC',
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_ORIGIN: origin,
    DATABASE_URL: databaseUrl,
    SESSION_SECRET: database.secrets.sessionSecret,
    PASSWORD_PEPPER: database.secrets.passwordPepper,
    OPEN_SIGN_UP: 'yes',
    WEB_ROOT: inRoot('dist'),
  };
  const migrationEnv = {
    ...env,
    MIGRATION_DATABASE_URL: database.migrationUrl('brierbook'),
    APPLICATION_ACCOUNT: database.applicationAccount,
  };
  run(process.execPath, [inRoot('build/server/cli/migrate.js')], { env: migrationEnv });
  run(process.execPath, [inRoot('build/server/cli/load-demo.js')], { env });

  server = startProcess(process.execPath, ['--enable-source-maps', inRoot('build/server/index.js')], { env });
  void server.ended.then(({ code }) => {
    if (isStopping) return;
    console.error(`The server ended with status ${code}.`);
    void stop(1);
  });
  await until(() => isStopping || isReady(`${origin}/readyz`), 'The start of the server');
  if (!isStopping)
    console.log(
      `\nBrierbook is running: ${origin}\n${run(process.execPath, [inRoot('build/server/cli/load-demo.js'), '--sign-ins'], { env, quiet: true })}Stop with Ctrl-C.`,
    );
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  await stop(1);
}

async function isReady(address) {
  try {
    return (await fetch(address)).ok;
  } catch {
    return false; // not listening yet
  }
}
