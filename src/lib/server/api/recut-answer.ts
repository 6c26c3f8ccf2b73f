import type { PairChange, RecutPage, RecutRow } from '../../schemas/recut.ts';
import { bare, questionAnswer } from './sheet-answers.ts';

/** Re-cuts as programs see them. */

export const recutNoteAnswer = (row: RecutRow) => ({
	...{ number: row.number, kind: row.kind, state: row.state, fileName: row.fileName },
	...{ words: row.words, step: row.step, share: row.share },
	...{ createdAt: row.createdAt, createdBy: row.createdBy },
	...{ appliedAt: row.appliedAt, appliedBy: row.appliedBy },
	...{ putBackAt: row.putBackAt, putBackBy: row.putBackBy },
});

export const recutAnswer = (page: RecutPage) => ({
	...recutNoteAnswer(page),
	...{ stale: page.stale, hindrance: page.hindrance },
	question: page.question && questionAnswer(page.question),
	remembered: page.remembered.map(({ about, words, fileName }) => ({ about, words, fileName })),
	refusal: page.refusal && { ...page.refusal, findings: page.refusal.findings.map(bare) },
	change: page.change && changeAnswer(page.change),
	...{ report: page.report, loses: page.loses },
});

const changeAnswer = ({ pairs, ...change }: NonNullable<RecutPage['change']>) => ({
	...change,
	pairs: {
		gained: pairs.gained.map(pairAnswer),
		lost: pairs.lost.map(pairAnswer),
		changed: pairs.changed.map(pairAnswer),
		counts: pairs.counts,
	},
});

const pairAnswer = ({ a, b, before, after }: PairChange) => ({ a, b, before, after });
