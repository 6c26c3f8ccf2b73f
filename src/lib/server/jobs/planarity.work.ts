import {
	borderKinds,
	crossedBorders,
	partedBorders,
	type BorderList,
} from '../../engines/borders/index.ts';
import type { Coverage } from '../../engines/boundaries/index.ts';
import { splittingSet } from '../../engines/graph/index.ts';
import type { PlanarWitness } from '../../schemas/desk.ts';

export type PlanarityNote = { planar: boolean; witness: PlanarWitness | null };

const line = borderKinds.indexOf('line');

/** Above so many regions it is not worked out which of them would have to be split: it takes seconds. */
const mostSplit = 20_000;

/**
 * Whether the graph of the line borders can be drawn without crossings; if not, why not, in words, and an
 * irreducible set of what would have to go: regions counted part by part, pairs that share no line.
 */
export function planarityOf(coverage: Coverage, borders: BorderList): PlanarityNote {
	const lines = linesOf(borders);
	const crossed = crossedBorders(coverage.keys.length, lines);
	if (!crossed) return { planar: true, witness: null };
	const split = coverage.keys.length > mostSplit ? null : splitOf(coverage, lines);
	const sentence = inWords(coverage, crossed.regions, split);
	return { planar: false, witness: { ...crossed, split, sentence } };
}

function linesOf({ a, b, kind, at }: BorderList) {
	return {
		a: a.filter((_, i) => kind[i] === line),
		b: b.filter((_, i) => kind[i] === line),
		at: at.filter((_, i) => kind[i >> 1] === line),
	};
}

function splitOf(
	coverage: Coverage,
	lines: Pick<BorderList, 'a' | 'b' | 'at'>,
): PlanarWitness['split'] {
	const parted = partedBorders(coverage, lines);
	const found = splittingSet(parted);
	if (!found) return null;
	const { owner, a, b } = parted;
	const pairs = found.pairs.map((i): [number, number] => [owner[a[i]], owner[b[i]]]);
	return { regions: found.regions, pairs };
}

function inWords(
	{ names, regionParts }: Coverage,
	regions: readonly number[],
	split: PlanarWitness['split'],
): string {
	const start =
		'The borders cannot all be drawn in a plane without crossing, so that four inks may not do';
	if (split) return `${start}. They could if ${whatIf(names, split)}.`;
	const scattered = regions.filter((region) => regionParts[region + 1] - regionParts[region] > 1);
	if (scattered.length === 0) return `${start}.`;
	const verb = scattered.length === 1 ? 'has' : 'have';
	const named = listed(scattered.map((region) => names[region]));
	return `${start}: ${named} ${verb} parts in several places.`;
}

/** "each part of Tipton and St. Martin were a region of its own, and A and B did not border". */
function whatIf(
	names: readonly string[],
	{ regions, pairs }: NonNullable<PlanarWitness['split']>,
): string {
	const parts = `each part of ${listed(regions.map((region) => names[region]))} were a region of its own`;
	const apart = pairs.map(([a, b]) => `${names[a]} and ${names[b]} did not border`);
	return [...(regions.length > 0 ? [parts] : []), ...apart].join(', and ');
}

function listed(names: readonly string[], most = 5): string {
	if (names.length > most) {
		return `${names.slice(0, most).join(', ')} and ${names.length - most} more`;
	}
	return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}
