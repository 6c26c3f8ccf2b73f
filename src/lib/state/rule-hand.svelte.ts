import { SvelteSet } from 'svelte/reactivity';
import type { Desk } from './desk.svelte';
import { keepPair, type PairKind } from './rule-edits';
import type { RuleNames } from './rule-words';

/** A rule about two regions of which the second is still to be chosen on the sheet. */
export interface Pairing {
	kind: PairKind;
	from: number;
}

/** What the hand holds while rules are made: regions that are ticked, and a pair begun. */
export class RuleHand {
	/** keys of the regions ticked in the table of regions */
	readonly ticked = new SvelteSet<string>();
	pairing: Pairing | null = $state.raw(null);
	/** for the live region: what became of a pair */
	spoken = $state('');

	constructor(private readonly desk: Desk) {}

	get names(): RuleNames {
		const { numbers, nameOf, draft } = this.desk;
		return {
			region: (key) => {
				const region = numbers.get(key);
				return region === undefined ? key : nameOf(region);
			},
			ink: (ink) => draft.document.palette.inks[ink]?.name || `ink ${ink + 1}`,
			sheet: (number) =>
				draft.document.ties.find(({ sheet }) => sheet === number)?.name ?? `sheet ${number}`,
		};
	}

	tick(keys: readonly string[], on: boolean): void {
		for (const key of keys) {
			if (on) this.ticked.add(key);
			else this.ticked.delete(key);
		}
	}

	begin(kind: PairKind, from: number): void {
		this.pairing = { kind, from };
		this.desk.view = 'sheet';
		this.spoken = '';
	}

	/** The second region: the rule is made, and the first is selected again. */
	complete(other: number): void {
		const { pairing, desk } = this;
		if (!pairing) return;
		if (other === pairing.from) {
			this.spoken = 'That is the region itself. Choose another.';
			return;
		}
		this.keep(pairing.kind, pairing.from, other);
		this.pairing = null;
		desk.select(pairing.from, true);
	}

	/** Ends without a rule. */
	end(): void {
		if (!this.pairing) return;
		this.desk.select(this.pairing.from, true);
		this.pairing = null;
		this.spoken = 'No rule was made.';
	}

	keep(kind: PairKind, a: number, b: number): void {
		const { key } = this.desk.sheet.regions;
		const names = `${this.desk.nameOf(a)} and ${this.desk.nameOf(b)}`;
		this.desk.draft.change(`keep ${names} ${kind}`, keepPair(kind, key[a], key[b]));
		this.spoken = `${names} are kept ${kind}.`;
	}
}
