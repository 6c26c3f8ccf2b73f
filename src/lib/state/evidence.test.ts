import { describe, expect, it } from 'vitest';
import { proofEvidence } from './evidence';

/** A square with one diagonal, and a fifth region beside it. */
const list = { a: Uint32Array.of(0, 1, 2, 0, 0, 3), b: Uint32Array.of(1, 2, 3, 3, 2, 4) };
const nameOf = (region: number) => `R${region}`;

describe('what a proof shows on the sheet', () => {
	it('is the regions of a refuted part and the borders it needs', () => {
		const borders: [number, number][] = [
			[2, 1],
			[0, 2],
		];
		const shown = proofEvidence({ kind: 'refutation', regions: [0, 1, 2], borders }, nameOf, list);
		expect(shown.strong).toEqual([0, 1, 2]);
		expect(shown.borders).toEqual([1, 4]);
		expect(shown.words).toContain('2 borders');
	});

	it('is all borders among them where none is named, and none for a ring', () => {
		const regions = [0, 1, 2];
		expect(proofEvidence({ kind: 'refutation', regions }, nameOf, list).borders).toEqual([0, 1, 4]);
		expect(proofEvidence({ kind: 'odd-cycle', regions }, nameOf, list).borders).toEqual([]);
	});
});
