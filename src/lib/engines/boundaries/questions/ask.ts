import { foundIn } from '../found.ts';
import type { BoundaryOptions } from '../options.ts';
import type { Question, Sketch } from '../question.ts';
import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { askAxes } from './ask-axes.ts';
import { askCrs } from './ask-crs.ts';
import { askKeys } from './ask-keys.ts';

/** What a question is asked about: a layer that was read, as it lay before anything was done to it. */
export interface Asked {
	layer: RawLayer;
	sketch: Sketch | null;
	fileName: string;
	options: BoundaryOptions;
}

/** Adds to a refusal the question whose answer would let the file be read, where there is one. */
export function withQuestion(refusal: Refusal, asked: Asked): Refusal {
	if (refusal.question) return refusal;
	const question = questionFor(refusal, asked);
	return question
		? new Refusal(refusal.code, refusal.message, refusal.findings, question)
		: refusal;
}

function questionFor({ code }: Refusal, asked: Asked): Question | null {
	const { layer, sketch, options } = asked;
	const found = foundIn(layer, options.crs ?? layer.crs, null, sketch);
	if (code === 'crs-missing') return askCrs(found, asked.fileName);
	if (code === 'axes-swapped') return askAxes(found);
	if (code === 'duplicate-keys') return askKeys(found, layer.table.ids, options);
	return null;
}
