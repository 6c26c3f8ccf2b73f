import { borderKinds, type BorderKind, type BorderList } from '$lib/engines/borders/border-list';
import type { CrossedBorders } from '$lib/engines/borders/planarity';

/** The borders of a list that lie on the ways of a witness, by number. */
export function bordersOn(
	paths: readonly (readonly number[])[],
	{ a, b }: Pick<BorderList, 'a' | 'b'>,
): number[] {
	const name = (one: number, other: number) => `${Math.min(one, other)} ${Math.max(one, other)}`;
	const on = new Set(paths.flatMap((path) => path.slice(1).map((to, i) => name(path[i], to))));
	return [...a.keys()].filter((border) => on.has(name(a[border], b[border])));
}

/** Those among them that no line of the file makes, which a cartographer may take back. */
export function loneLinks(
	{ paths }: Pick<CrossedBorders, 'paths'>,
	list: BorderList,
): { a: number; b: number; kind: BorderKind }[] {
	const { a, b, kind } = list;
	return bordersOn(paths, list)
		.map((i) => ({ a: a[i], b: b[i], kind: borderKinds[kind[i]] }))
		.filter((link) => link.kind !== 'line');
}

const because: Record<BorderKind, string> = {
	line: 'by a line',
	point: 'at a point',
	water: 'across water',
	gap: 'across water',
	hand: 'added by hand',
};

/** Why the borders that count cannot be drawn in a plane, told by the sheet's own regions. */
export function crossedSentence(
	crossed: CrossedBorders,
	counted: BorderList,
	nameOf: (region: number) => string,
): string {
	const names = crossed.hubs.map(nameOf);
	const ways = crossed.paths.some((path) => path.length > 2)
		? ', directly or through regions of its own'
		: '';
	const told =
		crossed.kind === 'K5'
			? `${listed(names)} each border every other one of the five${ways}`
			: `${listed(names.slice(0, 3))} each border ${listed(names.slice(3))}${ways}`;
	const links = loneLinks(crossed, counted)
		.slice(0, 4)
		.map(({ a, b, kind }) => `${nameOf(a)} and ${nameOf(b)} (${because[kind]})`);
	const rests = links.length ? ` It rests on ${listed(links)}.` : '';
	return `The borders that count cannot all be drawn in a plane without crossing: ${told}.${rests}`;
}

const listed = (words: readonly string[]): string =>
	words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
