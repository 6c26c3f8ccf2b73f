import { todayOf } from '$lib/engines/territories/problem-of-draft';
import type { TerritoryDraft, TerritoryEntry } from '$lib/engines/territories/territory-draft';
import { dropClosedBases, give } from './territory-edits';

interface Gift {
	regions: readonly number[];
	/** key of the territory, null for none */
	territory: string | null;
	/** its number */
	to: number;
	label: string;
}

type Change = (label: string, edit: (draft: TerritoryDraft) => TerritoryDraft) => void;

/** From this many regions on, copying the whole document would be felt under the hand. */
const large = 4_000;

/**
 * Gestures on a large sheet run ahead of the document: the numbers that every figure is made of change at
 * once, the document, which is copied whole for undo and saving, a moment later and in the same order.
 */
export class HandedAhead {
	/** territory of every region, ahead of the document; null when nothing waits */
	assignment: Int32Array | null = $state.raw(null);

	readonly #keys: readonly string[];
	readonly #change: Change;
	#waiting: Gift[] = [];
	#timer: ReturnType<typeof setTimeout> | undefined;
	/** numbers that belong to an assignment by keys, under one list of territories */
	#known = new WeakMap<object, { entries: readonly TerritoryEntry[]; numbers: Int32Array }>();

	constructor(keys: readonly string[], change: Change) {
		this.#keys = keys;
		this.#change = change;
	}

	give(gift: Gift, from: Int32Array, entries: readonly TerritoryEntry[]) {
		const next = from.slice();
		for (const region of gift.regions) next[region] = gift.to;
		this.#waiting.push(gift);
		this.assignment = next;
		clearTimeout(this.#timer);
		if (this.#keys.length < large) this.settle(entries);
		else this.#timer = setTimeout(() => this.settle(entries), 0);
	}

	/** Puts what waits into the document, one step a gesture. */
	settle(entries?: readonly TerritoryEntry[]) {
		clearTimeout(this.#timer);
		const gifts = this.#waiting.splice(0);
		const numbers = this.assignment;
		gifts.forEach(({ regions, territory, label }, place) => {
			const keys = regions.map((region) => this.#keys[region]);
			this.#change(label, (draft) => {
				const next = dropClosedBases(keys)(give(keys, territory)(draft));
				const isLast = place === gifts.length - 1 && numbers && entries === next.territories;
				if (isLast) this.#known.set(next.assignment, { entries, numbers });
				return next;
			});
		});
		if (gifts.length) this.assignment = null;
	}

	/** Territory number of every region in an assignment by keys. */
	numbered(assignment: TerritoryDraft['assignment'], territories: TerritoryEntry[]): Int32Array {
		const known = this.#known.get(assignment);
		if (known?.entries === territories) return known.numbers;
		const numbers = todayOf(this.#keys, { territories, assignment });
		this.#known.set(assignment, { entries: territories, numbers });
		return numbers;
	}
}
