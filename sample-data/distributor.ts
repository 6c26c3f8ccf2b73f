import { outletsOf, type Outlets } from './outlets.ts';
import { roadsOf } from './roads.ts';
import { fairRounds } from './rounds.ts';
import { situationFrom, type Situation } from './situation.ts';
import type { District } from './survey.ts';

/** Quellorn Bakery Supply, made up: what it has in every district, and who looks after which. */
export interface Distributor {
	rows: (Outlets & { code: string; name: string; territory: string })[];
	territories: TerritoryRow[];
	/** districts that only a ferry joins to the rest, with where it goes */
	ferries: { from: string; to: string }[];
	/** a division that keeps every rule, by territory key: shows that 10 % can be met */
	fair: string[];
	/** key of the territory that is in two pieces today */
	torn: string;
}

export interface TerritoryRow {
	key: string;
	name: string;
	person: string;
	/** code of the district it is served from, '' for none */
	base: string;
	capacity: number;
	email: string;
	note: string;
}

/** Twelve full-time shares and a part-time one; the leaver has none. */
const shares = [1, 1, 1, 1, 1, 1, 1, 1, 1, 1, 1, 1, 0.6];

const people = [
	...['Runa Oster', 'Milo Varn', 'Tilda Greve', 'Joss Aldin', 'Edda Kroll', 'Pavo Lindre'],
	...['Signe Marr', 'Otto Fenwyr', 'Liv Tarrow', 'Bram Osk', 'Nela Hurst', 'Kaj Dorrin'],
	...['Asta Wendel', 'Ruben Skold'],
];

export function distributor(districts: readonly District[], seed: number): Distributor {
	const roads = roadsOf(districts);
	const outlets = outletsOf(districts, seed);
	const load = outlets.map(({ hours }) => hours);
	const fair = fairRounds(roads, load, shares, seed);
	const situation = situationFrom(roads, load, shares, fair);
	const bases = [...shares.keys()].map((round) => baseOf(round, situation, fair, load));
	const keys = keysFor(bases, situation, districts);
	const named = (round: number) => territoryRow(round, keys, bases, situation, districts);
	return {
		rows: districts.map(({ code, name }, at) => ({
			...{ code, name },
			...outlets[at],
			territory: keys[situation.today[at]],
		})),
		territories: keys.map((_, round) => named(round)).sort((a, b) => (a.key < b.key ? -1 : 1)),
		ferries: roads.ferries.map(([a, b]) => ({ from: districts[a].code, to: districts[b].code })),
		fair: [...fair].map((round) => keys[round]),
		torn: keys[situation.torn],
	};
}

/** The busiest district that a round has both today and in the fair division; the newcomer's is given. */
function baseOf(
	round: number,
	{ newcomer, base, today }: Situation,
	fair: Int32Array,
	load: readonly number[],
): number {
	if (round === newcomer) return base;
	const own = [...fair.keys()].filter((d) => fair[d] === round && today[d] === round);
	return own.reduce((best, district) => (load[district] > load[best] ? district : best));
}

/** T01 to T12 in the order of their bases' codes, then the leaver's T13 and the newcomer's T14. */
function keysFor(
	bases: readonly number[],
	{ newcomer }: Situation,
	districts: readonly District[],
): string[] {
	const order = [...bases.keys()].filter((round) => round !== newcomer);
	order.sort((a, b) => (districts[bases[a]].code < districts[bases[b]].code ? -1 : 1));
	const place = (round: number) => [...order, bases.length, newcomer].indexOf(round) + 1;
	return [...bases, -1].map((_, round) => `T${String(place(round)).padStart(2, '0')}`);
}

function territoryRow(
	round: number,
	keys: readonly string[],
	bases: readonly number[],
	situation: Situation,
	districts: readonly District[],
): TerritoryRow {
	const leaves = round === shares.length;
	const key = keys[round];
	const vacant = key === vacantKey(keys, situation);
	const person = vacant ? '' : people[Number(key.slice(1)) - 1];
	const base = leaves ? null : districts[bases[round]];
	return {
		...{ key, person },
		name: base ? base.name : 'Old western round',
		base: base?.code ?? '',
		capacity: shares[round] ?? 1,
		email: person ? `${person.toLowerCase().replace(' ', '.')}@quellorn.example` : '',
		note: noteOf(round, leaves, vacant, situation),
	};
}

function noteOf(round: number, leaves: boolean, vacant: boolean, { newcomer }: Situation): string {
	if (leaves) return 'closes: retires at the end of the year';
	if (round === newcomer) return 'new hire: starts with the base alone';
	if (vacant) return 'vacant: to be filled, stays';
	return shares[round] < 1 ? 'part time' : '';
}

/** A quiet full-time round has nobody at the time. */
function vacantKey(keys: readonly string[], situation: Situation): string {
	const { newcomer, over, under, torn } = situation;
	const quiet = [...shares.keys()].find(
		(round) => shares[round] === 1 && ![newcomer, over, under, torn].includes(round),
	);
	return keys[quiet ?? 0];
}
