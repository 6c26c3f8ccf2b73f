import type { ReasonedRules } from '$lib/engines/borders';
import type { Draft } from '$lib/engines/editions/draft';

/** The rule for borders of a draft, part by part: a lock changes the document and none of these. */
export class BorderRules {
	#pointTouches = $derived.by(() => this.document().pointTouches);
	#leastMetres = $derived.by(() => this.document().leastMetres);
	#waterKm = $derived.by(() => this.document().waterKm);
	#struck = $derived.by(() => this.document().struck);
	#added = $derived.by(() => this.document().added);
	now: ReasonedRules = $derived({
		pointTouches: this.#pointTouches,
		leastMetres: this.#leastMetres,
		waterKm: this.#waterKm,
		struck: this.#struck,
		added: this.#added,
	});

	constructor(private readonly document: () => Draft) {}
}
