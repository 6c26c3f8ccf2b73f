import { borderKinds, type BorderKind, type BorderList } from '$lib/engines/borders/border-list';
import type { CrossedBorders } from '$lib/engines/borders/planarity';

/** The borders on the ways of a witness that no file's line makes, which a cartographer may take back. */
export function loneLinks(
	{ paths }: CrossedBorders,
	{ a, b, kind }: BorderList,
): { a: number; b: number; kind: BorderKind }[] {
	const on = new Map<string, true>();
	for (const path of paths)
		for (let i = 1; i < path.length; i++)
			on.set(`${Math.min(path[i - 1], path[i])} ${Math.max(path[i - 1], path[i])}`, true);
	return Array.from(a, (from, i) => ({ a: from, b: b[i], kind: borderKinds[kind[i]] })).filter(
		(link) => link.kind !== 'line' && on.has(`${link.a} ${link.b}`),
	);
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
