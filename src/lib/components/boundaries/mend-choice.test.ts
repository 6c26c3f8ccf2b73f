import { describe, expect, it } from 'vitest';
import type { DeskFinding } from '$lib/schemas/desk';
import { kindsOfMend, MendChoice } from './mend-choice.svelte';

const sliver = (id: number, into: string): DeskFinding => ({
	...{ id, code: 'sliver', severity: 'warning', message: 'A sliver', regions: [into] },
	...{ at: [1, 2], acceptedBy: null, acceptedAt: null },
	offers: [
		{ mend: { kind: 'fill', at: [id, 2], into }, words: 'fill', usual: true },
		{ mend: { kind: 'fill', at: [id, 2], into: 'x' }, words: 'fill otherwise', usual: false },
	],
});

describe('ticking mends', () => {
	it('keeps one for each finding and what was chosen by hand', () => {
		const findings = [sliver(1, 'a'), sliver(2, 'b'), { ...sliver(3, 'c'), offers: undefined }];
		const choice = new MendChoice();
		choice.choose(findings[1], 1);
		choice.chooseUsual(findings);
		expect(choice.mends(findings)).toEqual([
			{ kind: 'fill', at: [1, 2], into: 'a' },
			{ kind: 'fill', at: [2, 2], into: 'x' },
		]);
		choice.choose(findings[0], null);
		expect(choice.mends(findings)).toHaveLength(1);
		expect(kindsOfMend(findings).map(({ code, findings: all }) => [code, all.length])).toEqual([
			['sliver', 2],
		]);
	});

	it('asks for one mend once, though two findings offer it', () => {
		const twice = [sliver(1, 'a'), { ...sliver(1, 'a'), id: 9 }];
		const choice = new MendChoice();
		choice.chooseUsual(twice);
		expect(choice.mends(twice)).toHaveLength(1);
	});
});
