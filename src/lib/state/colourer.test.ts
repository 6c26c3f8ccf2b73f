import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { colour } from '../engines/colouring/index.ts';
import type { ColouringProblem } from '../engines/colouring/problem.ts';
import { Colourer, type ColourReply, type ColourRequest } from './colourer.ts';
import { rehearsals } from './rehearsals.ts';

/** Stands in for the browser's worker: keeps what it is sent, answers with the engine when told to. */
class QuietWorker {
	onmessage: ((event: { data: ColourReply }) => void) | null = null;
	onerror: ((event: { message: string }) => void) | null = null;
	ended = false;
	asked: ColourRequest[] = [];
	postMessage(request: ColourRequest) {
		this.asked.push(structuredClone(request));
	}
	terminate() {
		this.ended = true;
	}
	async answer() {
		const { id, problem } = this.asked.at(-1)!;
		this.onmessage?.({ data: { id, result: await colour(problem), milliseconds: 1 } });
	}
}

function bench() {
	const workers: QuietWorker[] = [];
	const replies: ColourReply[] = [];
	const make = () => {
		workers.push(new QuietWorker());
		return workers.at(-1) as unknown as Worker;
	};
	return { workers, replies, colourer: new Colourer(make, (reply) => replies.push(reply)) };
}

/** a ring of six regions, coloured by turns */
const inks = Int32Array.of(0, 1, 0, 1, 0, 1);
const ring: ColouringProblem = {
	regions: 6,
	borders: { a: [0, 1, 2, 3, 4, 5], b: [1, 2, 3, 4, 5, 0] },
	inks: 'fewest',
	previous: inks,
	goal: 'fewest-changes',
};

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('rehearsals', () => {
	it('lock one region to another ink, and leave the problem as it was', () => {
		const made = rehearsals(ring, inks);
		expect(made.map(({ locks }) => [...(locks ?? [])])).toEqual([
			[-1, -1, 1, -1, -1, -1],
			[-1, -1, -1, -1, 1, -1],
		]);
		expect(ring.locks).toBeUndefined();
	});

	it('are none where there is nothing to recolour', () => {
		expect(rehearsals(ring, new Int32Array(6).fill(-1))).toEqual([]);
		expect(rehearsals(ring, new Int32Array(6))).toEqual([]);
	});
});

describe('a colourer that rehearses', () => {
	it('runs one after the other and tells nobody', async () => {
		const { colourer, workers, replies } = bench();
		colourer.rehearse(rehearsals(ring, inks));
		expect(workers[0].asked).toHaveLength(1);
		await workers[0].answer();
		expect(workers[0].asked).toHaveLength(2);
		await workers[0].answer();
		expect(workers[0].asked).toHaveLength(2);
		expect(replies).toEqual([]);
	});

	it('puts a question before what is left, in the same worker, with the same answer', async () => {
		const { colourer, workers, replies } = bench();
		colourer.rehearse(rehearsals(ring, inks));
		const id = colourer.ask(ring);
		vi.advanceTimersByTime(500);
		await workers[0].answer();
		await workers[0].answer();
		expect(workers).toHaveLength(1);
		expect(workers[0].asked).toHaveLength(2);
		expect(replies).toEqual([{ id, result: await colour(ring), milliseconds: 1 }]);
	});

	it('does not let a question wait for a rehearsal without end', () => {
		const { colourer, workers } = bench();
		colourer.rehearse(rehearsals(ring, inks));
		const id = colourer.ask(ring);
		vi.advanceTimersByTime(1500);
		expect(workers.map(({ ended }) => ended)).toEqual([true, false]);
		expect(workers[1].asked.map((request) => request.id)).toEqual([id]);
	});
});

describe('a question nobody wants answered any more', () => {
	it('leaves the worker to the next one when it ends soon', async () => {
		const { colourer, workers, replies } = bench();
		colourer.ask(ring);
		colourer.forget();
		await workers[0].answer();
		vi.advanceTimersByTime(5000);
		expect(replies).toEqual([]);
		const id = colourer.ask(ring);
		await workers[0].answer();
		expect(workers).toHaveLength(1);
		expect(replies).toMatchObject([{ id }]);
	});

	it('is ended with its worker when it goes on', () => {
		const { colourer, workers } = bench();
		colourer.ask(ring);
		colourer.forget();
		vi.advanceTimersByTime(5000);
		expect(workers.map(({ ended }) => ended)).toEqual([true]);
	});
});
