import {
	readBoundaries,
	type BoundariesResult,
	type BoundaryOptions,
	type ByteSource,
	type Found,
} from '../../engines/boundaries/index.ts';
import type { RememberedAnswer } from '../../schemas/desk.ts';

/** An answer that the team gave for an earlier file, with the options that take it. */
export interface KnownAnswer extends RememberedAnswer {
	likeness: string;
	options: Pick<
		BoundaryOptions,
		'layer' | 'crs' | 'axes' | 'duplicateKeys' | 'keyField' | 'nameField'
	>;
}

export interface AnsweredReading {
	result: Exclude<BoundariesResult, { status: 'cancelled' }>;
	/** with the answers that were taken */
	options: BoundaryOptions;
	taken: KnownAnswer[];
}

/** Each reading takes one answer more; there are five things to ask about, one of which names the rest. */
const mostTaken = 4;

/**
 * Reads a file and, where it asks what the team answered before for a file that looked alike, takes that
 * answer and reads on. What was said for this very file goes before what is remembered; an answer with
 * which the file cannot be read at all is not taken, and the question stands.
 */
export async function readAnswered(
	source: ByteSource,
	options: BoundaryOptions,
	answers: KnownAnswer[],
	progress: (step: string, share: number) => void,
): Promise<AnsweredReading> {
	let reading: AnsweredReading = {
		result: await readOnce(source, options, progress),
		options,
		taken: [],
	};
	while (reading.taken.length < mostTaken) {
		const answer = nextAnswer(reading, answers);
		if (!answer) break;
		const next = { ...reading.options, ...answer.options };
		const result = await readOnce(source, next, progress);
		if (result.status === 'refused' && !result.question) break;
		reading = { result, options: next, taken: [...reading.taken, answer] };
	}
	return reading;
}

async function readOnce(
	source: ByteSource,
	options: BoundaryOptions,
	progress: (step: string, share: number) => void,
): Promise<AnsweredReading['result']> {
	const result = await readBoundaries(source, options, { progress });
	if (result.status === 'cancelled') throw new Error('reading ended without being asked to');
	return result;
}

/** Columns first: keys from another column may be what a question about doubled keys needs. */
function nextAnswer(reading: AnsweredReading, answers: KnownAnswer[]): KnownAnswer | undefined {
	const { result, options, taken } = reading;
	const open = answers.filter(
		(answer) =>
			!taken.some(({ about }) => about === answer.about) && !overrides(answer.options, options),
	);
	const question = result.status === 'refused' ? result.question : null;
	const found = result.status === 'accepted' ? result.found : question?.found;
	const columns = open.find((one) => one.about === 'columns' && found && fits(one, found));
	if (columns) return columns;
	return open.find(
		(one) => question && one.about === question.about && one.likeness === question.likeness,
	);
}

/** Whether it would change what was said for this file. */
const overrides = (answer: object, options: object): boolean => {
	const said = options as Record<string, unknown>;
	return Object.entries(answer).some(
		([name, value]) => said[name] !== undefined && said[name] !== value,
	);
};

/** The columns are there, and others than were taken anyway. */
function fits({ likeness, options }: KnownAnswer, found: Found): boolean {
	const { keyField = found.keyField, nameField = found.nameField } = options;
	const isThere = (name: string | undefined) =>
		name === undefined || name === 'id' || found.columns.some((column) => column.name === name);
	return (
		likeness === found.likeness &&
		isThere(options.keyField) &&
		isThere(options.nameField) &&
		(keyField !== found.keyField || nameField !== found.nameField)
	);
}
