import type { Draft } from '$lib/engines/editions/draft';
import type { DeskColouring } from '$lib/schemas/desk';

/** Another document and its colouring, looked at for a while; the draft stays as it is. */
export interface Trial {
	/** what keeping it does, as Undo will name it: "arrange the inks" */
	label: string;
	document: Draft;
	inks: Int32Array;
	answer: DeskColouring;
}

/** How a trial becomes a step of the draft. */
type Take = (label: string, document: Draft, answer: DeskColouring, inks: Int32Array) => void;

/**
 * What is on trial: the sheet shows it in place of the draft until it is kept, as one step that can be
 * undone, or dropped. A change of the draft drops it.
 */
export class OnTrial {
	now: Trial | null = $state.raw(null);

	constructor(private readonly take: Take) {}

	show(trial: Trial) {
		this.now = trial;
	}

	/** Takes it over into the draft. */
	keep() {
		const trial = this.now;
		if (!trial) return;
		this.now = null;
		// an arrangement of the same document is a document of its own, with other inks remembered for it
		this.take(trial.label, { ...trial.document }, trial.answer, trial.inks);
	}

	drop() {
		this.now = null;
	}
}
