import { borderKinds, crossedBorders, type BorderList } from '../../engines/borders/index.ts';
import type { PlanarWitness } from '../../schemas/desk.ts';

export type PlanarityNote = { planar: boolean; witness: PlanarWitness | null };

const line = borderKinds.indexOf('line');

/** Whether the graph of the line borders can be drawn without crossings; if not, why not, in words. */
export function planarityOf(
	names: readonly string[],
	parts: readonly number[],
	borders: BorderList,
): PlanarityNote {
	const ends = (column: Uint32Array) => column.filter((_, i) => borders.kind[i] === line);
	const crossed = crossedBorders(names.length, { a: ends(borders.a), b: ends(borders.b) });
	if (!crossed) return { planar: true, witness: null };
	const sentence = inWords(crossed.regions, names, parts);
	return { planar: false, witness: { ...crossed, sentence } };
}

/** Told by the regions that lie in several places, which is what makes real maps cross. */
function inWords(
	regions: readonly number[],
	names: readonly string[],
	parts: readonly number[],
): string {
	const scattered = regions.filter((region) => parts[region] > 1).map((region) => names[region]);
	const start =
		'The borders cannot all be drawn in a plane without crossing, so that four inks may not do';
	if (scattered.length === 0) return `${start}.`;
	const named = scattered.slice(0, 4).join(', ');
	const more = scattered.length > 4 ? ` and ${scattered.length - 4} more` : '';
	const verb = scattered.length === 1 ? 'has' : 'have';
	return `${start}: ${named}${more} ${verb} parts in several places.`;
}
