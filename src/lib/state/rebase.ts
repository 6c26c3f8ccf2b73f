import type { Draft } from '$lib/engines/editions/draft';

/**
 * Two people changed the same draft. In: the draft both began from, mine, and theirs (already saved).
 * Out: theirs with my changes put on top, and the places where both had changed the same thing to
 * something different; there mine stands, and the caller says so. A three-way merge by field, by lock
 * and by rule; nothing else of theirs is lost.
 */
export function rebase(base: Draft, mine: Draft, theirs: Draft): { draft: Draft; both: string[] } {
	const both: string[] = [];
	const pick = <T>(name: string, was: T, my: T, their: T): T => {
		if (same(was, my)) return their;
		if (!same(was, their) && !same(my, their)) both.push(name);
		return my;
	};
	const fields = <T extends object>(name: string, was: T, my: T, their: T): T => {
		const merged: Record<string, unknown> = {};
		for (const key of new Set([...Object.keys(their), ...Object.keys(my)])) {
			const of = (whole: T) => (whole as Record<string, unknown>)[key];
			const value = pick(`${name} ${key}`, of(was), of(my), of(their));
			if (value !== undefined) merged[key] = value;
		}
		return merged as T;
	};
	return {
		draft: {
			inks: pick('number of inks', base.inks, mine.inks, theirs.inks),
			palette: pick('palette', base.palette, mine.palette, theirs.palette),
			locks: fields('lock on', base.locks, mine.locks, theirs.locks),
			forbidden: members(base.forbidden, mine.forbidden, theirs.forbidden),
			alike: members(base.alike, mine.alike, theirs.alike),
			apart: members(base.apart, mine.apart, theirs.apart),
			pointTouches: pick(
				'point touches',
				base.pointTouches,
				mine.pointTouches,
				theirs.pointTouches,
			),
			struck: members(base.struck, mine.struck, theirs.struck),
			added: members(base.added, mine.added, theirs.added),
			seed: pick('seed', base.seed, mine.seed, theirs.seed),
			layout: fields('layout', base.layout, mine.layout, theirs.layout),
		},
		both,
	};
}

const same = (one: unknown, other: unknown): boolean => text(one) === text(other);

/** JSON with the keys of every object in order, so that equal values read alike */
function text(value: unknown): string {
	if (Array.isArray(value)) return `[${value.map(text).join(',')}]`;
	if (value && typeof value === 'object') {
		const entries = Object.entries(value).filter(([, held]) => held !== undefined);
		return `{${entries
			.map(([key, held]) => `${key}:${text(held)}`)
			.sort()
			.join(',')}}`;
	}
	return JSON.stringify(value) ?? 'undefined';
}

/** Theirs, less what I took away, plus what I put in. */
function members<T>(base: readonly T[], mine: readonly T[], theirs: readonly T[]): T[] {
	const [was, my, their] = [base, mine, theirs].map((list) => new Set(list.map(text)));
	const kept = theirs.filter((item) => !was.has(text(item)) || my.has(text(item)));
	const put = mine.filter((item) => !was.has(text(item)) && !their.has(text(item)));
	return [...kept, ...put];
}
