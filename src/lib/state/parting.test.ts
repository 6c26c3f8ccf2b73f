import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../tests/support/blank-draft';
import { partInks } from '$lib/engines/colouring';
import type { ColouringProblem } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import { OnTrial, type Trial } from './on-trial.svelte';
import type { PaletteQuestion } from './palette-worker';
import { PartingOnDesk } from './parting.svelte';

const ring = { a: [0, 1, 2, 0], b: [1, 2, 3, 3] };
const inks = ['#e41a1c', '#a65628', '#377eb8'].map((hex, i) => ({ name: `Ink ${i + 1}`, hex }));

/** Answers as the browser's worker would: at once, but for what happens `meanwhile`. */
class QuickWorker {
	onmessage: ((event: { data: unknown }) => void) | null = null;
	constructor(private readonly meanwhile: () => void) {}
	postMessage(question: PaletteQuestion) {
		if (!('part' in question)) return;
		const parting = partInks(question.part);
		this.meanwhile();
		this.onmessage?.({ data: { parting } });
	}
	terminate() {}
}

function bench(
	colouring: Int32Array,
	locks?: Int32Array,
	meanwhile: (draft: { document: Draft }, problem: ColouringProblem) => void = () => {},
) {
	const kept: Trial[] = [];
	const trial = new OnTrial((one) => kept.push(one));
	const document = blankDraft({ palette: { id: 'x', name: 'X', inks } });
	const problem: ColouringProblem = { regions: 4, borders: ring, inks: 'fewest', locks };
	const answer = {
		...{ status: 'coloured' as const, inks: [...colouring], inksUsed: 2, lowerBound: 2 },
		...{ proof: { kind: 'edge' as const, regions: [0, 1] }, sentence: '' },
	};
	const draft = { document };
	const desk = {
		draft,
		colouring: { answer, inks: colouring },
		problemOf: () => problem,
		trial,
	};
	const parting = new PartingOnDesk(
		desk as unknown as ConstructorParameters<typeof PartingOnDesk>[0],
		() => new QuickWorker(() => meanwhile(draft, problem)) as unknown as Worker,
		() => 'Said.',
	);
	return { parting, trial, document };
}

describe('unsafe inks kept from touching', () => {
	it('are shown apart on trial, asking for more inks where fewer would bring them together again', () => {
		const { parting, trial, document } = bench(Int32Array.of(0, 1, 0, 1));
		parting.ask([[0, 1]], 'keep them apart');
		const { now } = trial;
		expect(now?.label).toBe('keep them apart');
		expect(now?.document).toEqual({ ...document, inks: 3 });
		expect(now?.answer).toMatchObject({ status: 'coloured', inksUsed: 3, lowerBound: 2 });
		expect(now?.answer).toMatchObject({ proof: { kind: 'not-proved' }, sentence: 'Said.' });
		const shown = [...(now?.inks ?? [])];
		expect(parting.changed).toBe(shown.filter((ink, region) => ink !== region % 2).length);
		ring.a.forEach((a, i) => {
			const pair = [shown[a], shown[ring.b[i]]].sort().join();
			expect(['0,0', '1,1', '2,2', '0,1']).not.toContain(pair);
		});
	});

	it('are shown on the draft as it is by then: what was edited meanwhile stays', () => {
		const rename = (draft: { document: Draft }) =>
			(draft.document = { ...draft.document, seed: 77 });
		const { parting, trial } = bench(Int32Array.of(0, 1, 0, 1), undefined, rename);
		parting.ask([[0, 1]], 'keep them apart');
		expect(trial.now?.document.seed).toBe(77);
	});

	it('are not shown on a draft that they no longer suit', () => {
		const lockThem = (draft: { document: Draft }, problem: ColouringProblem) => {
			draft.document = { ...draft.document, seed: 77 };
			problem.locks = Int32Array.of(0, 1, -1, -1);
		};
		const { parting, trial } = bench(Int32Array.of(0, 1, 0, 1), undefined, lockThem);
		parting.ask([[0, 1]], 'keep them apart');
		expect(trial.now).toBeNull();
		expect(parting).toMatchObject({ working: false, unparted: null });
		expect(parting.failure).toContain('changed meanwhile');
	});

	it('are told as forced by the locks that force it', () => {
		const { parting, trial } = bench(Int32Array.of(0, 1, 0, 1), Int32Array.of(0, 1, -1, -1));
		parting.ask([[0, 1]], 'keep them apart');
		expect(trial.now).toBeNull();
		expect(parting.unparted).toMatchObject({ status: 'impossible', locks: [0, 1] });
		parting.drop();
		expect(parting.unparted).toBeNull();
	});
});
