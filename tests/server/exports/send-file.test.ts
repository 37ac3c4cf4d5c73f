import { once } from 'node:events';
import { type Server } from 'node:http';
import { type AddressInfo } from 'node:net';
import express from 'express';
import { errorHandler } from '@/server/http/error-handler';
import { sendFile } from '@/server/http/send-file';
import { createLogger } from '@/server/runtime/logger';

async function* pieces(count: number, failsAfter = Infinity): AsyncGenerator<string> {
  for (let piece = 0; piece < count; piece += 1) {
    if (piece === failsAfter) throw new Error('the table went away');
    yield 'x'.repeat(100_000);
  }
}

describe('a file that is sent while it is made', () => {
  let server: Server;
  let address: string;
  beforeAll(async () => {
    const app = express();
    const file = { fileName: 'closes.csv', contentType: 'text/csv' };
    app.get('/whole', (_, response) => sendFile(response, { ...file, pieces: pieces(20) }));
    app.get('/cut', (_, response) => sendFile(response, { ...file, pieces: pieces(20, 10) }));
    app.get('/none', (_, response) => sendFile(response, { ...file, pieces: pieces(20, 0) }));
    app.use(errorHandler(createLogger('silent')));
    server = app.listen(0, '127.0.0.1');
    await once(server, 'listening');
    address = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  });
  afterAll(() => server.close());

  it('arrives whole, with its name', async () => {
    const answer = await fetch(`${address}/whole`);
    expect(answer.headers.get('content-disposition')).toBe('attachment; filename="closes.csv"');
    expect((await answer.text()).length).toBe(2_000_000);
  });

  it('is cut off, not ended, when a later piece fails', async () => {
    const answer = await fetch(`${address}/cut`);
    await expect(answer.text()).rejects.toThrow();
  });

  it('is refused like any other request when its first piece fails', async () => {
    const answer = await fetch(`${address}/none`);
    expect(answer.status).toBe(500);
    expect(await answer.json()).toMatchObject({ error: { code: 'internal' } });
  });
});
