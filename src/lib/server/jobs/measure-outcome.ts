import {
	takeTexts,
	takeValues,
	type Join,
	type RawTable,
	type TableNote,
	type TakenValues,
	type TypedColumn,
} from '../../engines/measures/index.ts';
import { Sum } from '../../engines/measures/values/sum.ts';
import type { ColumnChoice, ColumnOutcome, TableOptions } from '../../schemas/measure-review.ts';
import { changeOf, type Standing } from './measure-change.ts';
import { proposedColumns } from './measure-proposal.ts';
import { sentenceOf, type Names } from './measure-words.ts';

export type { Standing } from './measure-change.ts';

export interface Joined {
	table: RawTable;
	typed: TypedColumn[];
	join: Join;
}

export interface OutcomeInput {
	options: TableOptions;
	regions: Names;
	/** what the sheet has already */
	standing: Standing[];
}

/** A column as it would be stored. */
export interface TakenColumn {
	outcome: ColumnOutcome;
	/** before anything is added to it; null for words and where the column cannot be taken */
	taken: TakenValues | null;
	texts: (string | null)[] | null;
	/** as it is to be stored: with `add`, on top of what is there */
	stored: Float64Array | null;
}

/** The columns chosen, or proposed while nobody has chosen, with all that is to be known before taking over. */
export const takeColumns = (joined: Joined, input: OutcomeInput): TakenColumn[] =>
	(input.options.columns ?? proposedColumns(joined.typed, joined.join))
		.filter(({ column }) => column < joined.typed.length)
		.map((choice) =>
			choice.kind === 'number'
				? takeNumbers(joined, choice, input)
				: takeWords(joined, choice, input),
		);

export const outcomeOf = (joined: Joined, input: OutcomeInput): ColumnOutcome[] =>
	takeColumns(joined, input).map(({ outcome }) => outcome);

function takeNumbers(
	{ typed, join }: Joined,
	choice: ColumnChoice,
	input: OutcomeInput,
): TakenColumn {
	const column = typed[choice.column];
	const taken = takeValues(join, column, choice);
	const told = wordsOf(taken.notes, input.regions);
	const values = taken.status === 'taken' ? taken.values : null;
	const against = changeOf(choice, values, null, input);
	return {
		taken: taken.status === 'taken' ? taken : null,
		...{ texts: null, stored: against.stored },
		outcome: {
			choice,
			refusals: [...told.refusals, ...against.refusals],
			notes: told.notes,
			sums: { ...sumsOf(join, column), stored: taken.status === 'taken' ? taken.total : 0 },
			missing: values ? values.filter(Number.isNaN).length : 0,
			change: against.change,
		},
	};
}

function takeWords(
	{ table, join }: Joined,
	choice: ColumnChoice,
	input: OutcomeInput,
): TakenColumn {
	const rule = choice.doubled === 'sum' ? 'refuse' : choice.doubled;
	const taken = takeTexts(join, table.cells[choice.column], rule);
	const told = wordsOf(taken.notes, input.regions);
	const texts = taken.status === 'taken' ? taken.values : null;
	const against = changeOf(choice, null, texts, input);
	return {
		...{ taken: null, texts, stored: null },
		outcome: {
			choice,
			refusals: [...told.refusals, ...against.refusals],
			notes: told.notes,
			sums: null,
			missing: texts ? texts.filter((text) => text === null).length : 0,
			change: against.change,
		},
	};
}

/** Errors are why a column is refused; it is named where they are shown, so its heading is left out here. */
function wordsOf(notes: TableNote[], regions: Names) {
	const say = (note: TableNote) => {
		const said = sentenceOf(note, regions);
		const heading = `"${note.column}": `;
		const bare = said.startsWith(heading) ? said.slice(heading.length) : said;
		return bare.charAt(0).toUpperCase() + bare.slice(1);
	};
	return {
		refusals: notes.filter(({ severity }) => severity === 'error').map(say),
		notes: notes.filter(({ severity }) => severity !== 'error').map(say),
	};
}

/** What the file says in this column and how much of it stands in rows that belong to a region. */
function sumsOf(join: Join, { values }: TypedColumn) {
	const [file, joined, lost] = [new Sum(), new Sum(), new Sum()];
	let lostRows = 0;
	values.forEach((value, row) => {
		if (Number.isNaN(value)) return;
		file.add(value);
		if (join.region[row] >= 0) return joined.add(value);
		lost.add(value);
		lostRows++;
	});
	return { file: file.value, joined: joined.value, lost: lost.value, lostRows };
}
