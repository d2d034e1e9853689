import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { setTimeout as sleep } from 'node:timers/promises';
import { expect, it } from 'vitest';
import { exclusively } from '../../scripts/setup/exclusive.mjs';

const folder = `/somewhere/${process.pid}`;

it('lets one body run at a time', async () => {
  let inside = 0;
  let most = 0;
  async function body(): Promise<void> {
    inside += 1;
    most = Math.max(most, inside);
    await sleep(30);
    inside -= 1;
  }
  await Promise.all([1, 2, 3, 4].map(() => exclusively(folder, 'testing', body)));
  expect(most).toBe(1);
});

it('does not make different folders wait for each other', async () => {
  await exclusively(folder, 'testing', () => exclusively(`${folder}/other`, 'testing', () => Promise.resolve(), 200));
});

it('gives the place up when a body fails', async () => {
  await expect(exclusively(folder, 'testing', () => Promise.reject(new Error('no')))).rejects.toThrow('no');
  await expect(exclusively(folder, 'testing', () => Promise.resolve('next'), 1_000)).resolves.toBe('next');
});

it('says who keeps it when the wait is over', async () => {
  await exclusively(folder, 'testing', async () => {
    const second = exclusively(folder, 'testing', () => Promise.resolve(), 100);
    await expect(second).rejects.toThrow('Another command has been testing for 0.1 s.');
  });
});

it('is free again when the process that held it was killed', async () => {
  const holder = spawn(
    process.execPath,
    [
      '--input-type=module',
      '--eval',
      `import { exclusively } from './scripts/setup/exclusive.mjs';
       await exclusively('${folder}', 'testing', () => { console.log('held'); return new Promise((done) => setTimeout(done, 60_000)); });`,
    ],
    { cwd: process.cwd(), stdio: ['ignore', 'pipe', 'inherit'] },
  );
  try {
    await once(holder.stdout, 'data');
    await expect(exclusively(folder, 'testing', () => Promise.resolve(), 100)).rejects.toThrow('Another command');
    holder.kill('SIGKILL');
    await expect(exclusively(folder, 'testing', () => Promise.resolve('free'), 10_000)).resolves.toBe('free');
  } finally {
    holder.kill('SIGKILL');
  }
});
