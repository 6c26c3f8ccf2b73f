import { counted } from '$lib/components/format';
import type { TerritoryDesk } from './territories.svelte';
import { give } from './territory-edits';
import { amount, deviationWords } from './territory-words';

/** What a press on a region gives it to: a territory's key, 'none' to take it away, null: it gives nothing. */
export type InHand = string | null;
export const none = 'none';

/**
 * Assignment by hand: the territory that is in the hand, the regions that are selected, and what the last
 * gesture came to in one sentence. One gesture is one step that can be undone.
 */
export class HandOut {
	inHand: InHand = $state(null);
	/** whether a drag on the sheet draws a line round regions instead of moving the sheet */
	lasso = $state(false);
	/** numbers of the regions selected */
	picked: ReadonlySet<number> = $state.raw(new Set());
	/** what the last gesture came to, for the live region and the line under the sheet */
	said = $state('');

	readonly #territories: TerritoryDesk;

	constructor(territories: TerritoryDesk) {
		this.#territories = territories;
	}

	/** "Give to North" */
	get label(): string {
		return `Give to ${this.nameOf(this.inHand)}`;
	}

	nameOf(hand: InHand): string {
		return this.#territories.entry(hand)?.name ?? 'no territory';
	}

	toggle(region: number) {
		const next = new Set(this.picked);
		const { desk } = this.#territories;
		const gone = next.delete(region);
		if (!gone) next.add(region);
		this.picked = next;
		const what = gone ? 'no longer selected' : 'selected';
		this.said = `${desk.nameOf(region)} ${what}, ${counted(next.size, 'region')} in all.`;
	}

	/** Adds regions to those selected. */
	pick(regions: Iterable<number>) {
		const before = this.picked.size;
		this.picked = new Set([...this.picked, ...regions]);
		const { size } = this.picked;
		this.said =
			size === before
				? 'No region more was selected.'
				: `${counted(size - before, 'region')} selected${before ? `, ${size} in all` : ''}.`;
	}

	clear() {
		if (this.picked.size) this.said = 'Nothing selected.';
		this.picked = new Set();
	}

	/** Hands the selected regions to the territory in the hand. */
	givePicked() {
		const { inHand } = this;
		if (inHand === null || !this.picked.size) return;
		this.give([...this.picked], inHand);
		this.picked = new Set();
	}

	/** Hands regions to a territory ('none': to none), as one step. */
	give(regions: readonly number[], hand: string) {
		const territories = this.#territories;
		if (!territories.mayEdit) return;
		const key = hand === none ? null : hand;
		const to = key === null ? -1 : (territories.numbers.get(key) ?? -1);
		const moving = regions.filter((region) => territories.assignment[region] !== to);
		if (!moving.length) {
			this.said = `${this.#named(regions)} already with ${this.nameOf(hand)}.`;
			return;
		}
		const from = new Set(moving.map((region) => territories.assignment[region]));
		const label = `give ${this.#named(moving)} to ${this.nameOf(hand)}`;
		const { proposal, draft, desk } = territories;
		if (proposal) proposal.give?.(moving, key, label);
		else {
			const keys = moving.map((region) => desk.sheet.regions.key[region]);
			draft.change(label, give(keys, key));
		}
		this.said = this.#told(moving, to, from);
	}

	#named(regions: readonly number[]): string {
		return regions.length === 1
			? this.#territories.desk.nameOf(regions[0])
			: counted(regions.length, 'region');
	}

	#told(moved: readonly number[], to: number, from: ReadonlySet<number>): string {
		const { entries, torn } = this.#territories;
		const givers = [...from].filter((t) => t >= 0);
		const by = givers.length === 1 ? `, from ${entries[givers[0]].name}` : '';
		const touched = [to, ...givers].filter((t) => t >= 0);
		const loads = touched.slice(0, 3).map((t) => this.#standing(t));
		const tears = torn
			.filter(({ territory }) => touched.includes(territory))
			.map(({ territory, parts }) => {
				const { name } = entries[territory];
				return `${name} is torn into ${counted(parts.filter((part) => part.length).length, 'part')}.`;
			});
		const given = `${this.#named(moved)} given to ${entries[to]?.name ?? 'no territory'}${by}.`;
		return [given, ...tears, ...loads, ...this.#warned(moved, to)].join(' ');
	}

	/** "North: 412 visits, 3.1 % over." */
	#standing(t: number): string {
		const { entries, figures, loads, counts } = this.#territories;
		const [figure] = figures;
		if (!figure) return `${entries[t].name}: ${counted(counts.regions[t], 'region')}.`;
		const { load, deviation } = loads[0];
		return `${entries[t].name}: ${amount(load[t], figure.unit)}, ${deviationWords(deviation[t])}.`;
	}

	/** rules that the gesture goes against; it is done all the same */
	#warned(moved: readonly number[], to: number): string[] {
		const { desk, document, entries } = this.#territories;
		const key = entries[to]?.key ?? null;
		return moved.flatMap((region) => {
			const own = desk.sheet.regions.key[region];
			const lock = document.locks[own];
			const words = [];
			if (lock && lock.territory !== key)
				words.push(`${desk.nameOf(region)} is locked to ${this.nameOf(lock.territory)}.`);
			for (const entry of entries)
				if (entry.base === own && entry.key !== key)
					words.push(`${desk.nameOf(region)} is the base of ${entry.name}.`);
			return words;
		});
	}
}
