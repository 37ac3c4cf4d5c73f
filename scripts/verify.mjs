// Verifies every seal chain of the database: `npm run verify`. Reads DATABASE_URL, else the development database.
import { existsSync, readFileSync } from 'node:fs';
import { inRoot } from './places.mjs';
import { createConnection } from 'mariadb';
import { verifyChain } from './verify-chain.mjs';

const query = `
  SELECT f.desk_id AS deskId, f.trader_id AS traderId, f.sequence, f.previous_hash AS previousHash, f.hash, f.commitment,
         f.sealed_at_microseconds AS sealedAtMicroseconds, c.salt, c.payload
    FROM sealed_forecast f LEFT JOIN sealed_content c ON c.desk_id = f.desk_id AND c.forecast_id = f.id
   ORDER BY f.desk_id, f.trader_id, f.sequence`;

const developmentUrl = inRoot('var/main/database-url');
if (process.env.DATABASE_URL === undefined && !existsSync(developmentUrl)) {
  console.error('There is no database to verify: set DATABASE_URL, or let `npm start` make the development database.');
  process.exit(2);
}
const url = new URL(process.env.DATABASE_URL ?? readFileSync(developmentUrl, 'utf8').trim());
const connection = await createConnection({
  host: url.hostname,
  port: Number(url.port || 3306),
  user: decodeURIComponent(url.username),
  password: decodeURIComponent(url.password),
  database: url.pathname.slice(1),
  bigIntAsNumber: false,
});

let chains = 0;
let seals = 0;
let broken = 0;
let chain = [];
function close() {
  if (chain.length === 0) return;
  chains += 1;
  for (const { sequence, finding } of verifyChain(chain)) {
    broken += 1;
    console.error(`desk ${chain[0].deskId} trader ${chain[0].traderId} seal ${sequence}: ${finding}`);
  }
  chain = [];
}
try {
  for await (const row of connection.queryStream(query)) {
    if (chain.length > 0 && (chain[0].deskId !== row.deskId || chain[0].traderId !== row.traderId)) close();
    chain.push(row);
    seals += 1;
  }
  close();
} finally {
  await connection.end();
}
console.log(`${chains} chains, ${seals} seals, ${broken} findings`);
process.exitCode = broken === 0 ? 0 : 1;
