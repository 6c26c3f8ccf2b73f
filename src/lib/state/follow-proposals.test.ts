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
});
