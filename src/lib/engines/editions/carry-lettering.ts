import {
	carriedRow,
	quoted,
	type CarriedRow,
	type CarryGround,
	type Carrying,
} from '../boundaries/recut/index.ts';
import type { Lettering } from '../sheet/layout/lettering.ts';

/**
 * What was said of single names, carried over to new boundaries. A region that was split leaves place,
 * abbreviation and precedence to its largest piece, whose name it most likely keeps; a name that was not
 * to be set is not set on any piece. Where regions were merged the first one told of stands.
 * Never throws; over the same boundaries all stands.
 */
export function carryLettering(
	ground: CarryGround,
	lettering: Lettering,
): { lettering: Lettering; rows: CarriedRow[] } {
	const { placed, abbreviations, hidden, first } = lettering;
	const places = toLargest(ground, Object.entries(placed), 'name placed', (key) => {
		return `The place of the name of ${quoted(key)}, set by hand,`;
	});
	const shorts = toLargest(ground, Object.entries(abbreviations), 'abbreviation', (key) => {
		return `The abbreviation of ${quoted(key)}`;
	});
	const firsts = toLargest(
		ground,
		first.map((key): [string, true] => [key, true]),
		'name first',
		(key) => `That the name of ${quoted(key)} comes first`,
	);
	const none = carryHidden(ground, hidden);
	return {
		lettering: {
			...structuredClone(lettering),
			placed: Object.fromEntries(places.entries.map(([key, place]) => [key, { ...place }])),
			abbreviations: Object.fromEntries(shorts.entries),
			first: firsts.entries.map(([key]) => key),
			hidden: none.keys,
		},
		rows: [places, shorts, firsts, none].flatMap(({ rows }) => rows),
	};
}

const gone = 'the region is gone';

function toLargest<T>(
	ground: CarryGround,
	told: [string, T][],
	what: string,
	subject: (key: string) => string,
) {
	const now = new Map<string, T>();
	const rows = told.map(([key, value]) => {
		const carrying: Carrying = { what, keys: [key], subject: subject(key) };
		const heirs = ground.heirsOf(key).map(ground.key);
		if (!heirs.length) return carriedRow(carrying, 'dropped', [], gone);
		const [heir] = heirs;
		if (now.has(heir)) return carriedRow(carrying, 'doubled', [heir]);
		now.set(heir, value);
		return carriedRow(carrying, 'followed', [heir]);
	});
	return { entries: [...now], rows };
}

function carryHidden(ground: CarryGround, hidden: readonly string[]) {
	const keys = new Set<string>();
	const rows = hidden.map((key) => {
		const subject = `That the name of ${quoted(key)} is not set`;
		const carrying: Carrying = { what: 'name hidden', keys: [key], subject };
		const heirs = ground.heirsOf(key).map(ground.key);
		if (!heirs.length) return carriedRow(carrying, 'dropped', [], gone);
		const isNew = heirs.filter((heir) => keys.size < keys.add(heir).size);
		const outcome = !isNew.length ? 'doubled' : heirs.length > 1 ? 'copied' : 'followed';
		return carriedRow(carrying, outcome, heirs);
	});
	return { keys: [...keys], rows };
}
