import { afterAll, describe, expect, it } from 'vitest';
import { createPool, wasStopped } from './pool.ts';

const pool = createPool({ threads: 1 });
afterAll(() => pool.close());

/** A palette whose mend takes a while: many inks, all alike, all touching. */
const slow = new TextEncoder().encode(
	JSON.stringify({ inks: Array(24).fill('#808080'), mend: true }),
);
const quick = new TextEncoder().encode(JSON.stringify({ inks: ['#000000', '#ffffff'] }));

describe('a pool of threads', () => {
	it('answers', async () => {
		const { status, body } = await pool.run('checkPaletteJson', quick);
		expect([status, JSON.parse(body).passes]).toEqual([200, true]);
	});

	it('ends a busy thread when it is told to, and goes on with the next task', async () => {
		const asker = new AbortController();
		const running = pool.run('checkPaletteJson', slow, { signal: asker.signal });
		setTimeout(() => asker.abort(), 50);
		const problem = await running.catch((error: unknown) => error);
		expect(wasStopped(problem)).toBe(true);
		expect((await pool.run('checkPaletteJson', quick)).status).toBe(200);
	});
});
