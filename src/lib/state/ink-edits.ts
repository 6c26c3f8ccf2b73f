import type { Draft } from '$lib/engines/editions/draft';
import type { Ink } from '$lib/engines/palettes/palette';
import { furthestInk } from '$lib/engines/palettes/furthest-ink';
import { counted } from '$lib/components/format';
import { changeInk, withInks } from './draft-edits';

/** Inks of a sheet's palette added, removed and moved, with everything that names them by number. */

/** One more ink: the well-known one that stands furthest from all there are, for whoever sees it least. */
export const addInk = (draft: Draft): Draft => {
	const { inks } = draft.palette;
	const { name, hex } = furthestInk(inks.map((ink) => ink.hex));
	return withInks([...inks, { name, hex }])(draft);
};

/** An ink with or without a hatch, fixed or not: what is undefined is left out. */
export const setInk =
	(number: number, change: { hatch?: Ink['hatch']; fixed?: true }) =>
	(draft: Draft): Draft => {
		const changed = changeInk(number, change)(draft);
		const inks = changed.palette.inks.map((ink) =>
			Object.fromEntries(Object.entries(ink).filter(([, value]) => value !== undefined)),
		) as unknown as Ink[];
		return { ...changed, palette: { ...changed.palette, inks } };
	};

/** Why an ink cannot be removed, in a sentence; '' when it can. */
export function whyKept(draft: Draft, number: number, colouring: ArrayLike<number>): string {
	const { palette, locks, forbidden, reserved, inks } = draft;
	if (palette.inks.length === 1) return 'A palette has one ink at least.';
	const regions = Array.from(colouring).filter((ink) => ink === number).length;
	const locked = Object.values(locks).filter(({ ink }) => ink === number).length;
	const rules = forbidden.filter(({ ink }) => ink === number).length;
	const uses = [
		regions ? `${counted(regions, 'region')} of the sheet` : '',
		locked ? counted(locked, 'lock') : '',
		rules ? `${counted(rules, 'rule')} that forbid it` : '',
		reserved.includes(number) ? 'the reserved inks' : '',
	].filter(Boolean);
	const called = palette.inks[number].name || `Ink ${number + 1}`;
	if (uses.length) return `${called} is in use by ${listed(uses)}.`;
	if (inks !== 'fewest' && palette.inks.length <= inks)
		return `The sheet is to use ${counted(inks, 'ink')}: ask for fewer at the stage of colours first.`;
	return '';
}

/** Takes out an ink that nothing uses; higher inks move up, with all that names them. */
export const removeInk =
	(number: number) =>
	(draft: Draft): Draft =>
		renumbered(draft, (ink) => (ink > number ? ink - 1 : ink), [
			...draft.palette.inks.slice(0, number),
			...draft.palette.inks.slice(number + 1),
		]);

/** Two inks change places; locks and rules go with their ink. */
export const swapInks =
	(one: number, two: number) =>
	(draft: Draft): Draft => {
		const inks = [...draft.palette.inks];
		[inks[one], inks[two]] = [inks[two], inks[one]];
		return renumbered(draft, swapOf(one, two), inks);
	};

export const swapOf =
	(one: number, two: number) =>
	(ink: number): number =>
		ink === one ? two : ink === two ? one : ink;

function renumbered(draft: Draft, to: (ink: number) => number, inks: readonly Ink[]): Draft {
	const locks = Object.entries(draft.locks).map(
		([key, lock]) => [key, { ...lock, ink: to(lock.ink) }] as const,
	);
	return {
		...withInks(inks)(draft),
		locks: Object.fromEntries(locks),
		forbidden: draft.forbidden.map((rule) => ({ ...rule, ink: to(rule.ink) })),
		reserved: draft.reserved.map(to).sort((a, b) => a - b),
	};
}

function listed(words: readonly string[]): string {
	if (words.length < 2) return words.join();
	return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
