import {
	withoutTie,
	withTie,
	type TieGround,
	type TieRules,
} from '$lib/engines/editions/edge-ties';
import type { Draft, EdgeTie } from '$lib/engines/editions/draft';
import type { TieState } from '$lib/schemas/ties';
import { counted } from '$lib/components/format';
import { evidence, type Evidence } from './evidence';

/** What people do to ties, each one step that can be undone, and how ties are told. */

/** Follows an adjoining sheet as it is now; the draft remembers no older tie to it. */
export const tie = withTie;
/** Takes back a tie with everything that is marked by it. */
export const untie = withoutTie;

/** "edition 3", "the draft, revision 12" */
export const followedWords = ({ edition, revision }: Pick<EdgeTie, 'edition' | 'revision'>) =>
	edition === null ? `the draft, revision ${revision}` : `edition ${edition}`;

/** What is asked because of a tie, counted from its marks. */
export function marksOf(draft: Draft, sheet: number): string {
	const locks = Object.values(draft.locks).filter((lock) => lock.tie === sheet).length;
	const forbidden = draft.forbidden.filter((one) => one.tie === sheet).length;
	return `${counted(locks, 'lock')}, ${counted(forbidden, 'forbidden ink')}`;
}

/** How a tie stands, where there is something to say. */
export function stateWords(state: TieState | undefined): string {
	if (!state) return '';
	if (state.name === null) return 'That sheet is not there any more. What it asked stays.';
	if (!state.stale || !state.latest) return '';
	return state.latest.edition === null
		? 'Its inks have changed since.'
		: `Its edition ${state.latest.edition} has been issued since.`;
}

/** What a tie would do, in sentences. */
export function tieWords(ground: TieGround, rules: TieRules): string[] {
	const sheet = `sheet ${ground.sheet}`;
	const locked = Object.keys(rules.locks).length;
	const words: string[] = [];
	if (ground.same.length > 0) {
		words.push(
			`${counted(ground.same.length, 'region')} ${ground.same.length === 1 ? 'is' : 'are'} on both sheets; ${locked} will be locked to the inks there.`,
		);
	}
	if (rules.beside.length > 0) {
		words.push(
			`${counted(rules.beside.length, 'region')} ${rules.beside.length === 1 ? 'lies' : 'lie'} beside regions of ${sheet} and may not have their inks.`,
		);
	}
	if (words.length === 0) words.push(`No region touches one of ${sheet} along the edge.`);
	if (rules.missing.length > 0) {
		const names = rules.missing.map((ink) => ground.inks[ink]?.name || `ink ${ink + 1}`);
		words.push(
			`This palette does not have ${names.join(', ')}; regions in ${rules.missing.length === 1 ? 'it' : 'them'} bind nothing here.`,
		);
	}
	return words;
}

/** Where a tie binds: on both sheets with a strong outline, beside with a light one. */
export function tieEvidence(
	ground: TieGround,
	rules: TieRules,
	numberOf: (key: string) => number | undefined,
): Evidence {
	const numbers = (keys: readonly string[]) => keys.flatMap((key) => numberOf(key) ?? []);
	const same = numbers(ground.same.map(({ key }) => key));
	const beside = numbers(rules.beside);
	return evidence({
		words: `Along the edge of sheet ${ground.sheet}. Solid outline: on both sheets. Dashed outline: beside it.`,
		...{ strong: same, light: beside, framed: true },
	});
}
