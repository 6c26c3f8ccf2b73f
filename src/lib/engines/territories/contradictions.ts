import { blocksOf } from './blocks.ts';
import { pinReliefs, pinsOf, pinWords, type Pin } from './pins.ts';
import type { Impossible, Relief, TerritoryProblem } from './problem.ts';
import { thatHelp } from './relieve.ts';

type Fault = Impossible & { reason: 'lock-cut-off' };

/**
 * Two rules that cannot both hold, whatever the map: two territories for one unit or for units tied
 * together, an outsider tied to a frozen territory, units to be apart that are tied to one territory, or
 * a tie to a territory that closes. Null when there is none. Linear time.
 */
export function contradiction(problem: TerritoryProblem): Impossible | null {
	const fault = find(problem);
	return fault && { ...fault, relief: thatHelp(problem, fault, fault.relief, find) };
}

function find(problem: TerritoryProblem): Fault | null {
	const pins = pinsOf(problem);
	const { block, blocks } = blocksOf(problem.graph.count, problem.together ?? []);
	const pinOf = new Map<number, Pin>();
	for (const pin of pins) {
		const { closing } = problem.territories[pin.territory];
		if (closing) return told([pin], `${pinWords(pin)}, which closes`);
		const first = pinOf.get(block[pin.unit]);
		if (first && first.territory !== pin.territory) return told([first, pin], clash(first, pin));
		if (!first) pinOf.set(block[pin.unit], pin);
	}
	return intruder(problem, pinOf, blocks) ?? alikeAndApart(problem, pinOf, block);
}

function clash(first: Pin, second: Pin): string {
	const both = `${pinWords(first)}, and ${pinWords(second)}`;
	return first.unit === second.unit
		? both
		: `${both}, but #${first.unit} and #${second.unit} must stay together`;
}

/** A unit that is to join a frozen territory by its own lock, as its base, or by being tied to another. */
function intruder(
	{ today, territories }: TerritoryProblem,
	pinOf: Map<number, Pin>,
	blocks: number[][],
): Fault | null {
	for (const [b, pin] of pinOf) {
		const { territory } = pin;
		if (!territories[territory].frozen) continue;
		const outsider = blocks[b].find((unit) => today[unit] !== territory);
		if (outsider === undefined) continue;
		const why =
			outsider === pin.unit
				? pinWords(pin)
				: `#${outsider} must stay together with #${pin.unit} of @${territory}`;
		const fault = told([pin], `${why}, but @${territory} is frozen without #${outsider}`);
		const units = outsider === pin.unit ? [outsider] : [outsider, pin.unit];
		const relief: Relief[] = [...fault.relief, { kind: 'unfreeze', territory }];
		return { ...fault, witness: { units, territories: [territory] }, relief };
	}
	return null;
}

function alikeAndApart(
	{ apart }: TerritoryProblem,
	pinOf: Map<number, Pin>,
	block: Int32Array,
): Fault | null {
	for (const [a, b] of apart ?? []) {
		const [p, q] = [pinOf.get(block[a]), pinOf.get(block[b])];
		const alike = p && q && p.territory === q.territory;
		if (block[a] !== block[b] && !alike) continue;
		const start = `#${a} and #${b} must be apart`;
		const fault =
			block[a] === block[b]
				? told([], `${start}, but other rules keep them together`)
				: told(p && q ? [p, q] : [], `${start}, but both are tied to @${p?.territory}`);
		return { ...fault, witness: { ...fault.witness, units: [a, b] } };
	}
	return null;
}

function told(pins: Pin[], message: string): Fault {
	return {
		status: 'impossible',
		reason: 'lock-cut-off',
		message: `${message}.`,
		witness: {
			units: [...new Set(pins.map(({ unit }) => unit))],
			territories: [...new Set(pins.map(({ territory }) => territory))],
		},
		relief: pins.flatMap(pinReliefs),
	};
}
