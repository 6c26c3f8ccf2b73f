import { describe, expect, it } from 'vitest';
import { mendPalette, type MendRequest } from '../engines/palettes/index.ts';
import { Mending, type MendQuestion, type MendReply } from './mending.svelte.ts';

/** Stands in for the browser's worker: keeps what it is sent, answers when told to. */
class QuietWorker {
	onmessage: ((event: { data: MendReply }) => void) | null = null;
	onerror: ((event: { message: string }) => void) | null = null;
	ended = false;
	asked: MendQuestion[] = [];
	postMessage(question: MendQuestion) {
		this.asked.push(structuredClone(question));
	}
	terminate() {
		this.ended = true;
	}
	answer() {
		this.onmessage?.({ data: { result: mendPalette(this.asked[0].mend) } });
	}
}

function bench() {
	const workers: QuietWorker[] = [];
	const mending = new Mending(() => {
		const worker = new QuietWorker();
		workers.push(worker);
		return worker as unknown as Worker;
	});
	return { mending, workers };
}

const request: MendRequest = { inks: ['#777777', '#7a7a7a'], touching: [[0, 1]] };

describe('a mend looked for off the page', () => {
	it('is the engine’s own answer, and its worker ends with it', () => {
		const { mending, workers } = bench();
		mending.ask(request);
		expect(mending).toMatchObject({ working: true, proposal: null });
		workers[0].answer();
		expect(mending).toMatchObject({ working: false, failure: '' });
		expect(mending.proposal).toEqual(mendPalette(request));
		expect(workers[0].ended).toBe(true);
	});

	it('can be stopped, and then proposes nothing', () => {
		const { mending, workers } = bench();
		mending.ask(request);
		mending.drop();
		expect(workers[0].ended).toBe(true);
		expect(mending).toMatchObject({ working: false, proposal: null, failure: '' });
	});

	it('leaves the search before when asked anew', () => {
		const { mending, workers } = bench();
		mending.ask(request);
		mending.ask({ ...request, seed: 1 });
		expect(workers.map(({ ended }) => ended)).toEqual([true, false]);
		expect(mending.working).toBe(true);
	});

	it('says how it failed', () => {
		const { mending, workers } = bench();
		mending.ask(request);
		workers[0].onerror?.({ message: 'out of memory' });
		expect(mending).toMatchObject({ working: false, proposal: null, failure: 'out of memory' });
	});
});
