import { describe, expect, it } from 'vitest';
import { proposeMends, type ProposalRequest } from '../engines/palettes/index.ts';
import { Mending } from './mending.svelte.ts';
import type { PaletteQuestion, PaletteReply } from './palette-worker.ts';

/** Stands in for the browser's worker: keeps what it is sent, answers when told to. */
class QuietWorker {
	onmessage: ((event: { data: PaletteReply }) => void) | null = null;
	onerror: ((event: { message: string }) => void) | null = null;
	ended = false;
	asked: PaletteQuestion[] = [];
	postMessage(question: PaletteQuestion) {
		this.asked.push(structuredClone(question));
	}
	terminate() {
		this.ended = true;
	}
	answer() {
		const [question] = this.asked;
		if (!('mend' in question)) return;
		for (const answer of proposeMends(question.mend)) this.onmessage?.({ data: { answer } });
		this.onmessage?.({ data: { ended: true } });
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

const request: ProposalRequest = {
	inks: [
		{ name: 'One', hex: '#777777' },
		{ name: 'Two', hex: '#7a7a7a' },
	],
	demands: [{ a: 0, b: 1, ciede2000: 12, grey: 5, sizesMm: [9, 9] }],
	locked: [],
	known: [],
};

describe('mends looked for off the page', () => {
	it('are the engine’s own answers, and the worker ends with them', () => {
		const { mending, workers } = bench();
		mending.ask(request);
		expect(mending).toMatchObject({ working: true, answers: [] });
		workers[0].answer();
		expect(mending).toMatchObject({ working: false, failure: '' });
		expect(mending.answers).toEqual([...proposeMends(request)]);
		expect(workers[0].ended).toBe(true);
	});

	it('can be stopped, and what was found stays until it is dropped', () => {
		const { mending, workers } = bench();
		mending.ask(request);
		const [first] = proposeMends(request);
		workers[0].onmessage?.({ data: { answer: first } });
		mending.stop();
		expect(workers[0].ended).toBe(true);
		expect(mending).toMatchObject({ working: false, answers: [first], failure: '' });
		workers[0].answer();
		expect(mending.answers).toEqual([first]);
		mending.drop();
		expect(mending.answers).toEqual([]);
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
		expect(mending).toMatchObject({ working: false, answers: [], failure: 'out of memory' });
	});
});
