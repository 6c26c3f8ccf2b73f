import type { Join, TypedColumn } from '../../engines/measures/index.ts';
import type { ColumnChoice } from '../../schemas/measure-review.ts';

/** Rules that lose nothing silently: several rows add up, what is no number or below zero must be decided. */
export function choiceFor(typed: TypedColumn): ColumnChoice {
	const { column, unit, percent, notNumbers } = typed;
	const kind = typed.kind === 'number' ? 'number' : 'text';
	const onlyGaps = notNumbers.length > 0 && notNumbers.every((one) => one.kind === 'placeholder');
	return {
		column,
		name: nameOf(typed),
		unit: kind === 'number' ? (unit ?? '').slice(0, 40) : '',
		kind,
		// shares do not add up, and words even less
		doubled: kind === 'number' && !percent ? 'sum' : 'refuse',
		empty: 'missing',
		notNumber: onlyGaps ? 'missing' : 'refuse',
		negative: 'refuse',
	};
}

/** Every column of numbers but the one that names the regions; words are taken when somebody asks. */
export const proposedColumns = (typed: readonly TypedColumn[], join: Join): ColumnChoice[] =>
	typed
		.filter(({ kind, column }) => kind === 'number' && column !== join.choice.column)
		.map(choiceFor);

/** The heading without its unit in brackets. */
function nameOf({ heading, unit }: TypedColumn): string {
	const bare = unit ? heading.replace(/\s*[[(][^\])]*[\])]\s*$/, '').trim() : heading.trim();
	return (bare || heading).slice(0, 200);
}
