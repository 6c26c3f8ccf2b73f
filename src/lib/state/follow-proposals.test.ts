import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { followProposals } from './follow-proposals';

describe('following proposals', () => {
	beforeEach(() => void vi.useFakeTimers());
	afterEach(() => void vi.useRealTimers());

	const known = [{ number: 1, state: 'running' as const }];
	const answers = (...bodies: (object[] | null)[]): typeof fetch =>
		(async () => {
			const body = bodies.length > 1 ? bodies.shift() : bodies[0];
			if (!body) throw new TypeError('no connection');
			return new Response(JSON.stringify(body));
		}) as typeof fetch;

	it('tells how far they are and, through a lost connection, when one has ended', async () => {
		const told: unknown[] = [];
		const ended = vi.fn();
		const running = [{ number: 1, state: 'running', step: 'Searching', share: 0.4 }];
		const done = [{ number: 1, state: 'kept', step: '', share: 1 }];
		const stop = followProposals(
			'/status',
			known,
			{ told: (now) => told.push(now), ended },
			answers(running, null, done),
		);
		await vi.advanceTimersByTimeAsync(2_500);
		expect(told).toEqual([running, []]);
		expect(ended).not.toHaveBeenCalled();
		await vi.advanceTimersByTimeAsync(1_000);
		expect(ended).toHaveBeenCalledOnce();
		stop();
		await vi.advanceTimersByTimeAsync(5_000);
		expect(told).toHaveLength(3);
	});

	it('says that no answer comes, also where a page comes in its place, and goes on asking', async () => {
		const page = '<!doctype html><title>Sign in</title>';
		const replies = [() => page, () => '[]', () => Promise.reject(new TypeError('torn'))];
		const fetcher = vi.fn(async () => new Response(await (replies.shift() ?? (() => '{}'))()));
		const reached: boolean[] = [];
		const stop = followProposals(
			'/status',
			known,
			{ told: () => undefined, ended: () => undefined, reached: (yes) => reached.push(yes) },
			fetcher as unknown as typeof fetch,
		);
		await vi.advanceTimersByTimeAsync(4_500);
		stop();
		expect(reached).toEqual([false, true, false, false]);
	});

	it('asks no more while the page is loaded anew', async () => {
		const done = [{ number: 1, state: 'kept', step: '', share: 1 }];
		let loaded = () => {};
		const ended = vi.fn(() => new Promise<void>((resolve) => (loaded = resolve)));
		const handlers = { told: () => undefined, ended };
		const stop = followProposals('/status', known, handlers, answers(done));
		await vi.advanceTimersByTimeAsync(10_000);
		expect(ended).toHaveBeenCalledOnce();
		loaded();
		await vi.advanceTimersByTimeAsync(1_500);
		expect(ended).toHaveBeenCalledTimes(2);
		stop();
	});
});
