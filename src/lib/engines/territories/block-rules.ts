import { mayEndIn, type Prepared } from './prepare.ts';

/** Whether the rules on single units let a unit and all it is tied to end in a territory. */
export function blockMayEndIn(prepared: Prepared, unit: number, territory: number): boolean {
	const block = prepared.blocks[prepared.block[unit]];
	if (block.length === 1) return mayEndIn(prepared, unit, territory);
	return block.every((member) => mayEndIn(prepared, member, territory));
}

/** Units fixed to each territory, ascending; a base first. */
export function fixedUnits({ fixed, problem, territories }: Prepared): number[][] {
	const units: number[][] = Array.from({ length: territories }, () => []);
	fixed.forEach((t, u) => {
		if (t < 0) return;
		if (problem.territories[t].base === u) units[t].unshift(u);
		else units[t].push(u);
	});
	return units;
}
