import type { Draft } from '$lib/engines/editions/draft';
import type { DeskColouring } from '$lib/schemas/desk';

/** Another document and its colouring, looked at for a while; the draft stays as it is. */
export interface Trial {
	/** what keeping it does, as Undo will name it: "arrange the inks" */
	label: string;
	document: Draft;
	inks: Int32Array;
	answer: DeskColouring;
	/**
	 * only the inks are others, and they go on changing by themselves: it does not take the keyboard, and
	 * is kept with the draft as it stands then
	 */
	arranges?: boolean;
	/** it answers other rules than the draft has by now: it can be looked at, and not kept */
	lookOnly?: boolean;
}

/** How a trial becomes a step of the draft. */
type Take = (trial: Trial) => void;

/**
 * What is on trial: the sheet shows it in place of the draft until it is kept, as one step that can be
 * undone, or dropped. A change of the draft drops it.
 */
export class OnTrial {
	now: Trial | null = $state.raw(null);
	/** how often it was dropped, or the draft changed */
	drops = $state(0);

	constructor(private readonly take: Take) {}

	show(trial: Trial) {
		this.now = trial;
	}

	/** Takes it over into the draft. */
	keep() {
		const trial = this.now;
		if (!trial || trial.lookOnly) return;
		this.now = null;
		this.take(trial);
	}

	drop() {
		this.now = null;
		this.drops++;
	}
}
