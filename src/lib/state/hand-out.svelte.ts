import type { Torn } from '$lib/engines/territories';
import { counted } from '$lib/components/format';
import type { TerritoryDesk } from './territories.svelte';
import { setOf } from './set-of';
import { amount, deviationWords, piecesOf } from './territory-words';

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
	picked: ReadonlySet<number> = $state.raw(setOf<number>([]));
	/** what the last gesture came to, for the live region and the line under the sheet */
	said = $state('');

	readonly #territories: TerritoryDesk;

	constructor(territories: TerritoryDesk) {
		this.#territories = territories;
	}

	/** The territories changed by whatever way: what was said of an earlier gesture no longer holds. */
	heard() {
		this.said = '';
	}

	/** "Give to North" */
	get label(): string {
		return `Give to ${this.nameOf(this.inHand)}`;
	}

	nameOf(hand: InHand): string {
		return this.#territories.entry(hand)?.name ?? 'no territory';
	}

	toggle(region: number) {
		const { desk } = this.#territories;
		const gone = this.picked.has(region);
		const others = [...this.picked].filter((one) => one !== region);
		const next = setOf(gone ? others : [...others, region]);
		this.picked = next;
		const what = gone ? 'no longer selected' : 'selected';
		this.said = `${desk.nameOf(region)} ${what}, ${counted(next.size, 'region')} in all.`;
	}

	/** Adds regions to those selected. */
	pick(regions: Iterable<number>) {
		const before = this.picked.size;
		this.picked = setOf([...this.picked, ...regions]);
		const { size } = this.picked;
		this.said =
			size === before
				? 'No region more was selected.'
				: `${counted(size - before, 'region')} selected${before ? `, ${size} in all` : ''}.`;
	}

	clear() {
		if (this.picked.size) this.said = 'Nothing selected.';
		this.picked = setOf([]);
	}

	/** Hands the selected regions to the territory in the hand. */
	givePicked() {
		const { inHand } = this;
		if (inHand === null || !this.picked.size) return;
		this.give([...this.picked], inHand);
		this.picked = setOf([]);
	}

	/**
	 * Hands regions to a territory ('none': to none), as one step. A base stays where it is, unless its
	 * territory closes; a territory that had no regions takes its base along.
	 */
	give(regions: readonly number[], hand: string) {
		const territories = this.#territories;
		if (!territories.mayEdit) return;
		const key = hand === none ? null : hand;
		const to = key === null ? -1 : (territories.numbers.get(key) ?? -1);
		const wanted = this.#withBase(regions, to).filter((r) => territories.assignment[r] !== to);
		const staying = wanted.filter((region) => this.#rootOf(region, key));
		const moving = wanted.filter((region) => !staying.includes(region));
		if (!moving.length) {
			this.said = wanted.length
				? this.#stays(staying, key)
				: `${this.#named(regions)} already with ${this.nameOf(hand)}.`;
			return;
		}
		const from = setOf(moving.map((region) => territories.assignment[region]));
		const { torn } = territories;
		territories.give(moving, key, `give ${this.#named(moving)} to ${this.nameOf(hand)}`);
		this.said = [this.#told(moving, to, from, torn), this.#stays(staying, key)].join(' ').trim();
	}

	/** the territory, other than `key`, that has its base in this region and keeps it */
	#rootOf(region: number, key: string | null) {
		const { desk, entries } = this.#territories;
		const own = desk.sheet.regions.key[region];
		return entries.find((one) => one.base === own && one.key !== key && !one.closing);
	}

	#withBase(regions: readonly number[], to: number): readonly number[] {
		const { counts, shares } = this.#territories;
		const base = shares[to]?.base ?? -1;
		return base >= 0 && counts.regions[to] === 0 && !regions.includes(base)
			? [...regions, base]
			: regions;
	}

	#stays(regions: readonly number[], key: string | null): string {
		const { desk } = this.#territories;
		return regions
			.map((r) => `${desk.nameOf(r)} stays: it is the base of ${this.#rootOf(r, key)?.name}.`)
			.join(' ');
	}

	#named(regions: readonly number[]): string {
		return regions.length === 1
			? this.#territories.desk.nameOf(regions[0])
			: counted(regions.length, 'region');
	}

	#told(
		moved: readonly number[],
		to: number,
		from: ReadonlySet<number>,
		before: readonly Torn[],
	): string {
		const { entries, torn } = this.#territories;
		const givers = [...from].filter((t) => t >= 0);
		const by = givers.length === 1 ? `, from ${entries[givers[0]].name}` : '';
		const touched = [to, ...givers].filter((t) => t >= 0);
		const loads = touched.slice(0, 3).map((t) => this.#standing(t));
		const tears = torn
			.filter(({ territory }) => touched.includes(territory))
			.filter(({ territory }) => piecesOf(torn, territory) > piecesOf(before, territory))
			.map(({ territory, parts }) => {
				const off = parts.slice(1).map((part) => this.#named(part));
				return `${entries[territory].name} is torn: cut off ${off.join(', ')}.`;
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

	/** locks that the gesture goes against; it is done all the same */
	#warned(moved: readonly number[], to: number): string[] {
		const { desk, document, entries } = this.#territories;
		const key = entries[to]?.key ?? null;
		return moved.flatMap((region) => {
			const lock = document.locks[desk.sheet.regions.key[region]];
			return lock && lock.territory !== key
				? [`${desk.nameOf(region)} is locked to ${this.nameOf(lock.territory)}.`]
				: [];
		});
	}
}
