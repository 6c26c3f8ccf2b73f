import { crsOf } from '../../engines/boundaries/crs.ts';
import type { Question } from '../../engines/boundaries/index.ts';
import { Refusal } from '../../engines/boundaries/refusal.ts';
import type { AnswerFields } from '../../schemas/recut-forms.ts';
import type { AnswerOptions } from './answer-words.ts';
import { Refused } from './outcomes.ts';

export interface Answer {
	/** that answer the question */
	options: AnswerOptions;
	/** given beside it, for this file */
	columns: Pick<AnswerOptions, 'keyField' | 'nameField'>;
}

/** The options that an answer stands for. Throws `Refused` with the field for what is no answer. */
export function answerTo(question: Question, fields: AnswerFields): Answer {
	const options =
		question.free && fields.typed !== ''
			? typed(question, fields.typed)
			: chosen(question, fields.choice);
	return { options, columns: columnsOf(question, fields) };
}

function chosen({ choices }: Question, value: string): AnswerOptions {
	const choice = choices.find((one) => one.value === value);
	if (!choice) throw new Refused('Choose one of the answers.', 'choice');
	return choice.options;
}

function typed(question: Question, text: string): AnswerOptions {
	if (question.about === 'crs') return { crs: knownSystem(text) };
	if (question.about === 'keys') return { keyField: column(question, text, 'typed') };
	if (question.about === 'layer') {
		if (!question.found.layers.some(({ name }) => name === text)) {
			throw new Refused(`The file has no layer "${text}".`, 'typed');
		}
		return { layer: text };
	}
	throw new Refused('Choose one of the answers.', 'choice');
}

/** A slip of the pen here would cost the file: what the reader does not know is asked for again. */
function knownSystem(text: string): string {
	try {
		crsOf(text);
		return text;
	} catch (problem) {
		if (problem instanceof Refusal) throw new Refused(problem.message, 'typed');
		throw problem;
	}
}

const columnsOf = (question: Question, { keyField, nameField }: AnswerFields) => ({
	...(keyField === '' ? {} : { keyField: column(question, keyField, 'keyField') }),
	...(nameField === '' ? {} : { nameField: column(question, nameField, 'nameField') }),
});

function column({ found }: Question, name: string, field: string): string {
	if (name === 'id' || found.columns.some((one) => one.name === name)) return name;
	throw new Refused(`The file has no column "${name}".`, field);
}
