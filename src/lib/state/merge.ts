/** Three-way merging of two people's work on one document: what both began from, mine, and theirs. */
export interface Merger {
	/** the places where both had changed the same thing to something different; there mine stands */
	both: string[];
	pick<T>(name: string, base: T, mine: T, theirs: T): T;
	/** by field: of records, or of objects with fields of their own */
	fields<T extends object>(name: string, base: T, mine: T, theirs: T): T;
	/** by member: theirs, less what I took away, plus what I put in */
	members<T>(base: readonly T[], mine: readonly T[], theirs: readonly T[]): T[];
	/** of a list whose members are edited in place: by their numbers while nobody put in or took away one */
	places<T>(name: string, base: readonly T[], mine: readonly T[], theirs: readonly T[]): T[];
}

export function merger(): Merger {
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
	const places = <T>(
		name: string,
		base: readonly T[],
		mine: readonly T[],
		theirs: readonly T[],
	): T[] => {
		if (base.length === mine.length && base.length === theirs.length)
			return base.map((was, i) => pick(`${name} ${i + 1}`, was, mine[i], theirs[i]));
		if (editedByBoth(base, mine, theirs)) both.push(`${name}s`);
		return members(base, mine, theirs);
	};
	return { both, pick, fields, members, places };
}

/** An object without the members that are merged by themselves, which would else be told as clashes whole. */
export function without<T extends object, K extends keyof T>(whole: T, ...names: K[]): Omit<T, K> {
	const left = new Set<string | number | symbol>(names);
	return Object.fromEntries(Object.entries(whole).filter(([name]) => !left.has(name))) as Omit<
		T,
		K
	>;
}

const same = (one: unknown, other: unknown): boolean =>
	Object.is(one, other) || text(one) === text(other);

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

function members<T>(base: readonly T[], mine: readonly T[], theirs: readonly T[]): T[] {
	const [was, my, their] = [base, mine, theirs].map((list) => new Set(list.map(text)));
	const kept = theirs.filter((item) => !was.has(text(item)) || my.has(text(item)));
	const put = mine.filter((item) => !was.has(text(item)) && !their.has(text(item)));
	return [...kept, ...put];
}

/** Whether one member is gone on both sides, and each side has something of its own in its place. */
function editedByBoth<T>(base: readonly T[], mine: readonly T[], theirs: readonly T[]): boolean {
	const [was, my, their] = [base, mine, theirs].map((list) => new Set(list.map(text)));
	const put = (side: Set<string>, other: Set<string>) =>
		[...side].some((item) => !was.has(item) && !other.has(item));
	const gone = [...was].some((item) => !my.has(item) && !their.has(item));
	return gone && put(my, their) && put(their, my);
}
