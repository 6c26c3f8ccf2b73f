import { SvelteMap } from 'svelte/reactivity';
import type { Mend, MendOffer } from '$lib/engines/boundaries/mends/mend';
import type { DeskFinding } from '$lib/schemas/desk';

export interface KindOfMend {
	code: string;
	/** findings of the kind that offer a usual mend */
	findings: DeskFinding[];
}

/** Which mends somebody has ticked for a preview: at most one for each finding. */
export class MendChoice {
	/** finding's number -> place among its offers */
	#chosen = new SvelteMap<number, number>();

	of(finding: DeskFinding): number | null {
		return this.#chosen.get(finding.id) ?? null;
	}

	choose(finding: DeskFinding, offer: number | null) {
		if (offer === null) this.#chosen.delete(finding.id);
		else this.#chosen.set(finding.id, offer);
	}

	/** Takes the usual mend wherever nothing was chosen by hand. */
	chooseUsual(findings: readonly DeskFinding[]) {
		for (const finding of findings)
			if (this.of(finding) === null) this.choose(finding, usualOf(finding));
	}

	clear() {
		this.#chosen.clear();
	}

	/** The ticked mends in the order of the findings, each once. */
	mends(findings: readonly DeskFinding[]): Mend[] {
		const texts = findings.flatMap((finding) => {
			const offer = this.#offer(finding);
			return offer ? [JSON.stringify(offer.mend)] : [];
		});
		return texts
			.filter((text, at) => texts.indexOf(text) === at)
			.map((text) => JSON.parse(text) as Mend);
	}

	#offer(finding: DeskFinding): MendOffer | null {
		const at = this.of(finding);
		return at === null ? null : (finding.offers?.[at] ?? null);
	}
}

function usualOf({ offers = [] }: DeskFinding): number | null {
	const usual = offers.findIndex((offer) => offer.usual);
	return usual < 0 ? null : usual;
}

/** Kinds of which two or more findings offer a usual mend, the most frequent first. */
export function kindsOfMend(findings: readonly DeskFinding[]): KindOfMend[] {
	const kinds: Record<string, DeskFinding[]> = {};
	for (const finding of findings)
		if (usualOf(finding) !== null) (kinds[finding.code] ??= []).push(finding);
	return Object.entries(kinds)
		.map(([code, all]) => ({ code, findings: all }))
		.filter((kind) => kind.findings.length > 1)
		.sort((a, b) => b.findings.length - a.findings.length);
}
