import type { DeskProposal, ProposalNote } from '$lib/schemas/desk-territories';
import { DraftState } from './draft.svelte';
import type { Keeper } from './kept-drafts';
import { rebasePlan, type PlanAnswer, type PlanOfRegions } from './save-plan';
import type { SaveDraft } from './save-draft';
import type { PlanOnShow, TerritoryDesk } from './territories.svelte';

export interface ProposalStart {
	given: DeskProposal;
	plan: PlanOfRegions;
	territories: TerritoryDesk;
	save: SaveDraft<PlanOfRegions, PlanAnswer>;
	keeper: Keeper<PlanOfRegions> | null;
}

/**
 * A proposal open on the desk: its plan with undo, saved by itself, and what the server says of it. The
 * sheet shows it as it stands: adopting it takes territories off today's list, and their numbers here
 * must never be older than that list.
 */
export class ProposalDesk implements PlanOnShow {
	given: DeskProposal = $state.raw()!;
	/** as the server last judged it */
	note: ProposalNote = $state.raw()!;
	inks: Readonly<Record<string, number>> = $state.raw()!;
	/** territories that would change ink, by key */
	changedInks: readonly string[] = $state.raw()!;
	readonly draft: DraftState<PlanOfRegions, PlanAnswer>;
	readonly territories: TerritoryDesk;

	/** place of each of the proposal's territories in today's list, -1 for one that is gone */
	#places = $derived.by(() =>
		this.given.territoryKeys.map((key) => this.territories.numbers.get(key) ?? -1),
	);
	plan = $derived.by(() => this.draft.document);
	assignment = $derived(this.#toToday(this.plan));
	before = $derived.by(() => this.#toToday(this.given.today));
	/** regions that the plan moves, by number */
	moved = $derived(
		Array.from(this.plan.keys()).filter((r) => this.plan[r] !== this.given.today[r]),
	);
	/** regions that were changed by hand since it was computed */
	byHand = $derived.by(() => {
		const { computed } = this.given;
		if (!computed) return [];
		return Array.from(this.plan.keys()).filter((r) => this.plan[r] !== computed[r]);
	});

	constructor({ given, plan, territories, save, keeper }: ProposalStart) {
		this.territories = territories;
		this.given = given;
		this.note = given;
		this.inks = given.inks;
		this.changedInks = given.changedInks;
		const { desk } = territories;
		this.draft = new DraftState({
			place: `${desk.sheet.id} proposal ${given.number}`,
			revision: given.revision,
			document: plan,
			savedAt: given.createdAt,
			save,
			keeper,
			rebase: rebasePlan((region) => desk.nameOf(region)),
			onsaved: ({ note, inks, changedInks }) => {
				this.note = note;
				this.inks = inks;
				this.changedInks = changedInks;
			},
		});
	}

	/** Whether it may be changed here: by right, and while it is neither adopted nor out of date. */
	get mayEdit(): boolean {
		const open = this.note.state === 'kept' || this.note.state === 'undecided';
		return open && !this.note.stale && this.territories.desk.may('territories.edit');
	}

	get name(): string {
		return this.note.name;
	}

	/** null while it can only be looked at */
	get give(): PlanOnShow['give'] {
		return this.mayEdit ? (regions, key, label) => this.#give(regions, key, label) : null;
	}

	/** The page was loaded again: it was adopted, named, checked against newer figures. */
	refresh(given: DeskProposal) {
		this.given = given;
		if (this.draft.dirty || given.revision < this.draft.revision) return;
		this.note = given;
		this.inks = given.inks;
		this.changedInks = given.changedInks;
		if (given.assignment) this.draft.refresh(given.revision, given.assignment, given.createdAt);
	}

	/** Gives regions back to where they are today. */
	giveBack(regions: readonly number[], label: string) {
		this.#change(label, (plan) => {
			for (const region of regions) {
				if (this.given.today[region] >= 0) plan[region] = this.given.today[region];
			}
		});
	}

	#give(regions: readonly number[], key: string | null, label: string) {
		const to = key === null ? -1 : this.given.territoryKeys.indexOf(key);
		if (to < 0) return;
		this.#change(label, (plan) => {
			for (const region of regions) plan[region] = to;
		});
	}

	#change(label: string, make: (plan: number[]) => void) {
		this.draft.change(label, (before) => {
			const after = [...before];
			make(after);
			return after.some((territory, region) => territory !== before[region]) ? after : before;
		});
	}

	#toToday(plan: PlanOfRegions): Int32Array {
		const places = this.#places;
		return Int32Array.from(plan, (territory) => (territory < 0 ? -1 : places[territory]));
	}
}
