import type { Row } from '../database/schema.ts';

type Answer = Pick<Row<'handover_answers'>, 'territory_key' | 'answer' | 'word' | 'author'>;

export interface Standing {
	state: Answer['answer'];
	word: string;
	by: string;
}

/**
 * Where a move stands after these answers, in the order they came. What a planner says settles all that was
 * said before. After it each person's last word counts: one dispute is enough, and nobody but the one who
 * disputed, or a planner, lifts it. Accepted is what everybody who was asked has accepted.
 * @param asked keys of the territories that the move concerns and that had a letter
 */
export function standingOf(answers: readonly Answer[], asked: readonly string[]): Standing {
	const settled = answers.findLastIndex(({ territory_key }) => territory_key === null);
	const base = answers[settled];
	const last = new Map(answers.slice(settled + 1).map((one) => [one.territory_key ?? '', one]));
	const disputes = [...last.values()].filter(({ answer }) => answer === 'disputed');
	if (disputes.length > 0) return together('disputed', disputes);
	if (base && base.answer !== 'proposed') return together(base.answer, [base]);
	const accepted = asked.map((key) => last.get(key)).filter((one) => one?.answer === 'accepted');
	if (asked.length > 0 && accepted.length === asked.length) {
		return together('accepted', [...last.values()]);
	}
	return { ...together('proposed', [...last.values()]), word: base?.word ?? '' };
}

const together = (state: Standing['state'], answers: readonly Answer[]): Standing => ({
	state,
	word: answers
		.map(({ word }) => word)
		.filter(Boolean)
		.join(' / '),
	by: answers.map(({ author }) => author).join(', '),
});
