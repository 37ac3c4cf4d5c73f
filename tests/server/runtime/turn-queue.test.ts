import { QueueFullError, TurnQueue } from '@/server/runtime/turn-queue';

const gate = () => {
  let open: () => void = () => undefined;
  const passed = new Promise<void>((resolve) => {
    open = resolve;
  });
  return { open, passed };
};
const settled = () => new Promise((resolve) => setImmediate(resolve));

describe('the queue of files to be read', () => {
  it('runs two at once, one of a person, and starts the next in order', async () => {
    const queue = new TurnQueue({ atOnce: 2, waiting: 10 });
    const started: string[] = [];
    const gates = { a1: gate(), a2: gate(), b1: gate(), c1: gate() };
    const runs = Object.entries(gates).map(([name, { passed }]) =>
      queue.run(name.slice(0, 1), async () => {
        started.push(name);
        await passed;
      }),
    );
    await settled();
    expect(started).toEqual(['a1', 'b1']);
    gates.b1.open();
    await settled();
    expect(started).toEqual(['a1', 'b1', 'c1']);
    gates.a1.open();
    await settled();
    expect(started).toEqual(['a1', 'b1', 'c1', 'a2']);
    gates.a2.open();
    gates.c1.open();
    await Promise.all(runs);
  });

  it('gives its place up when a reading fails, and refuses when too many wait', async () => {
    const queue = new TurnQueue({ atOnce: 1, waiting: 1 });
    await expect(queue.run('a', () => Promise.reject(new Error('bad file')))).rejects.toThrow('bad file');
    const first = gate();
    const running = queue.run('a', () => first.passed);
    const waiting = queue.run('b', () => Promise.resolve('read'));
    await expect(queue.run('c', () => Promise.resolve())).rejects.toThrow(QueueFullError);
    first.open();
    await running;
    await expect(waiting).resolves.toBe('read');
  });
});
