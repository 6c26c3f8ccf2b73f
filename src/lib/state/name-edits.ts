import type { Draft } from '$lib/engines/editions/draft';
import type { Lettering, PlacedName } from '$lib/engines/sheet/layout/lettering';

/** What people do to the names of a sheet, each a new draft; the old one is never touched. */

export const setNames =
	(change: Partial<Lettering>) =>
	(draft: Draft): Draft => ({
		...draft,
		layout: { ...draft.layout, lettering: { ...draft.layout.lettering, ...change } },
	});

const without = <T>(record: Record<string, T>, keys: readonly string[]): Record<string, T> => {
	const gone = new Set(keys);
	return Object.fromEntries(Object.entries(record).filter(([key]) => !gone.has(key)));
};

/** A name stands where it was put; one that was hidden is shown again. */
export const placeName =
	(key: string, place: PlacedName) =>
	(draft: Draft): Draft => {
		const { placed, hidden } = draft.layout.lettering;
		return setNames({
			placed: { ...placed, [key]: place },
			hidden: hidden.filter((one) => one !== key),
		})(draft);
	};

/** Names are set by themselves again: neither by hand nor hidden. */
export const letNames =
	(keys: readonly string[]) =>
	(draft: Draft): Draft => {
		const { placed, hidden } = draft.layout.lettering;
		const back = new Set(keys);
		if (!keys.some((key) => Object.hasOwn(placed, key) || hidden.includes(key))) return draft;
		return setNames({
			placed: without(placed, keys),
			hidden: hidden.filter((key) => !back.has(key)),
		})(draft);
	};

export const hideNames =
	(keys: readonly string[]) =>
	(draft: Draft): Draft => {
		const { placed, hidden } = draft.layout.lettering;
		const known = new Set(hidden);
		return setNames({
			placed: without(placed, keys),
			hidden: [...hidden, ...keys.filter((key) => !known.has(key))],
		})(draft);
	};

/** What is set where a name has no room; an empty text takes the abbreviation away. */
export const abbreviate =
	(short: Readonly<Record<string, string>>) =>
	(draft: Draft): Draft => {
		const { abbreviations } = draft.layout.lettering;
		const rest = without(abbreviations, Object.keys(short));
		const told = Object.entries(short)
			.map(([key, text]) => [key, text.trim().slice(0, mostLetters)] as const)
			.filter(([, text]) => text !== '');
		return setNames({ abbreviations: { ...rest, ...Object.fromEntries(told) } })(draft);
	};
export const mostLetters = 40;

/** Names that come before all others, those given last at the end. */
export const putFirst =
	(keys: readonly string[]) =>
	(draft: Draft): Draft => {
		const { first } = draft.layout.lettering;
		const known = new Set(first);
		return setNames({ first: [...first, ...keys.filter((key) => !known.has(key))] })(draft);
	};
