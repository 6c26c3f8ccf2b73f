import { tornParts } from '$lib/engines/territories';
import { joinedGraph } from '$lib/engines/territories/problem-of-draft';
import type { TerritoryDraft, TerritoryEntry } from '$lib/engines/territories/territory-draft';
import type { DeskTerritories, TerritoriesSaved } from '$lib/schemas/desk-territories';
import type { Desk } from './desk.svelte';
import { DraftState } from './draft.svelte';
import { HandOut } from './hand-out.svelte';
import { HandedAhead } from './handed-ahead.svelte';
import type { Keeper } from './kept-drafts';
import { judgePalette } from './palette-judgement';
import { rebaseTerritories } from './rebase-territories';
import type { SaveDraft } from './save-draft';
import { setOf } from './set-of';
import type { PlanAnswer, PlanOfRegions } from './save-plan';
import { inksByNumber, territoryBorders } from './territory-colours';
import { countRegions, figureOf, isOutside, loadsOf } from './territory-figures';
import { TerritoryInks } from './territory-inks.svelte';
import { asTerritories, numberTerritories } from './territory-numbers';
import { roomSentence } from './territory-words';

/**
 * A plan that is on the sheet in place of today's: a proposal. It numbers territories as today's list
 * does; whoever opens it sees to that.
 */
export interface PlanOnShow {
	name: string;
	/** territory of every region, -1 for none */
	assignment: Int32Array;
	/** ink of each territory, by key */
	inks: Readonly<Record<string, number>>;
	/** where every region was before, for the marks of what moves; null: nothing is marked */
	before: Int32Array | null;
	/** null where it can only be looked at */
	give: ((regions: readonly number[], territory: string | null, label: string) => void) | null;
	/** what undo, redo and saving speak of while it is shown; null: the territories' own */
	draft: DraftState<PlanOfRegions, PlanAnswer> | null;
}

export interface TerritoryStart {
	given: DeskTerritories;
	save: SaveDraft<TerritoryDraft, TerritoriesSaved>;
	keeper: Keeper<TerritoryDraft> | null;
	desk: Desk;
}

/** The territories of a sheet on the desk: their draft, the live figures, what is held in the hand. */
export class TerritoryDesk {
	given: DeskTerritories = $state.raw()!;
	readonly draft: DraftState<TerritoryDraft, TerritoriesSaved>;
	readonly desk: Desk;
	readonly hand: HandOut;
	readonly inksToday: TerritoryInks;

	/** a proposal on the sheet, or null for today's territories */
	proposal: PlanOnShow | null = $state.raw(null);
	/** the one territory looked at, by key */
	chosen: string | null = $state(null);
	/** counts how often a territory was opened, for the margin to scroll there */
	opened = $state(0);
	/** what a form that was sent does to the territories, for the word Undo */
	made: string | undefined;
	/** measures in the tables beside those with a tolerance, by id */
	measuresPicked: readonly string[] = $state.raw([]);

	document = $derived.by(() => this.draft.document);
	entries = $derived(this.document.territories);
	numbers = $derived(numberTerritories(this.entries));
	#handedOut = $derived(this.document.assignment);
	#ahead: HandedAhead;
	today = $derived.by(
		() => this.#ahead.assignment ?? this.#ahead.numbered(this.#handedOut, this.entries),
	);
	assignment = $derived(this.proposal?.assignment ?? this.today);
	inks = $derived.by(() =>
		inksByNumber(
			this.entries.map(({ key }) => key),
			this.proposal?.inks ?? this.inksToday.now,
		),
	);
	/** what the sheet paints */
	regionInks = $derived.by(() => {
		const { inks } = this;
		return this.assignment.map((territory) => (territory < 0 ? -1 : inks[territory]));
	});

	#waterLinks = $derived(this.document.waterLinks);
	#handLinks = $derived(this.document.handLinks);
	#tolerances = $derived(this.document.wishes.tolerances);
	graph = $derived.by(() => {
		const { regions, borders } = this.desk.sheet;
		const links = { waterLinks: this.#waterLinks, handLinks: this.#handLinks };
		return joinedGraph({ keys: regions.key, borders }, links);
	});
	shares = $derived.by(() => asTerritories(this.entries, this.desk.numbers));
	/** measures joined to these very regions */
	measures = $derived(this.given.measures.filter(({ stale }) => !stale));
	figures = $derived.by(() => {
		const tolerances = this.#tolerances;
		const ids = setOf([...Object.keys(tolerances), ...this.measuresPicked]);
		const picked = this.measures.filter(({ id }) => ids.has(id));
		const shown = picked.length ? picked : this.measures.slice(0, 1);
		return shown.map((measure) => figureOf(measure, tolerances[measure.id]));
	});
	/** what the plan comes to, for each of `figures` */
	loads = $derived.by(() =>
		this.figures.map(({ values }) => loadsOf(values, this.assignment, this.shares)),
	);
	counts = $derived(countRegions(this.assignment, this.entries.length));
	torn = $derived(
		tornParts(this.graph, this.assignment, this.shares, this.figures[0]?.values ?? null),
	);
	/** territories outside some tolerance */
	outside = $derived.by(() =>
		[...this.entries.keys()].filter((t) =>
			this.figures.some(({ tolerance }, m) => isOutside(this.loads[m].deviation[t], tolerance)),
		),
	);
	/** whether the tolerances leave room, for every measure that has one */
	room = $derived.by(() => {
		const staying = this.entries.filter(({ closing }) => !closing).length;
		return this.figures.flatMap(
			(figure, m) => roomSentence(figure, this.loads[m], staying, (r) => this.desk.nameOf(r)) ?? [],
		);
	});
	/** regions that a proposal moves */
	moved = $derived.by(() => {
		const before = this.proposal?.before;
		if (!before) return [];
		return [...this.assignment.keys()].filter((r) => this.assignment[r] !== before[r]);
	});
	borders = $derived.by(() =>
		territoryBorders(this.desk.countedBorders, this.assignment, this.entries.length),
	);
	/** territories whose ink differs from the one last saved */
	changedInks = $derived.by(() => {
		const { saved, now } = this.inksToday;
		return this.entries.filter(({ key }) => Object.hasOwn(saved, key) && now[key] !== saved[key]);
	});
	palette = $derived.by(() =>
		judgePalette({
			inks: this.desk.draft.document.palette.inks,
			colouring: this.inks,
			borders: this.borders,
			sizesMm: null,
		}),
	);

	constructor({ given, save, keeper, desk }: TerritoryStart) {
		this.desk = desk;
		this.given = given;
		this.inksToday = new TerritoryInks(given.inks, given.inkNote);
		this.#ahead = new HandedAhead(desk.sheet.regions.key, (label, edit) =>
			this.draft.change(label, edit),
		);
		this.draft = new DraftState({
			place: `${desk.sheet.id} territories`,
			revision: given.revision,
			document: given.draft,
			savedAt: given.savedAt ?? desk.sheet.savedAt,
			save,
			keeper,
			rebase: rebaseTerritories,
			onbefore: () => this.#ahead.settle(),
			onchange: () => {
				this.hand.heard();
				this.#colourSoon();
			},
			onsaved: ({ inks, inkNote }) => this.inksToday.adopt(inks, inkNote, !this.draft.dirty),
		});
		this.hand = new HandOut(this);
	}

	/** In the browser: the worker that finds inks for the territories after each change. */
	work(makeWorker: () => Worker): () => void {
		const rest = this.inksToday.work(makeWorker);
		if (this.draft.dirty || this.inksToday.trouble) this.#colourSoon();
		return () => {
			rest();
			this.draft.stop();
		};
	}

	/**
	 * The page was loaded again: after measures were joined, somebody else saved, or a form made the
	 * territories anew, which `made` names.
	 */
	refresh(given: DeskTerritories) {
		const newer = given.revision > this.draft.revision && !this.draft.dirty;
		this.given = given;
		this.draft.refresh(given.revision, given.draft, given.savedAt ?? this.draft.savedAt, this.made);
		this.made = undefined;
		if (newer) this.inksToday.adopt(given.inks, given.inkNote, true);
	}

	/** Hands regions to a territory, or to none; a proposal on show takes them in place of today. */
	give(regions: readonly number[], territory: string | null, label: string) {
		const { proposal, numbers, today, entries } = this;
		const to = numbers.get(territory ?? '') ?? -1;
		if (proposal) proposal.give?.(regions, territory, label);
		else this.#ahead.give({ regions, territory, to, label }, today, entries);
	}

	entry(key: string | null): TerritoryEntry | null {
		return this.entries[this.numbers.get(key ?? '') ?? -1] ?? null;
	}
	/** the territory of a region, or null */
	of(region: number): TerritoryEntry | null {
		return this.entries[this.assignment[region]] ?? null;
	}
	/** Looks at one territory; `open` brings what is decided about it into view beside the sheet. */
	look(key: string | null, open = false) {
		this.chosen = key;
		this.desk.panel = 'stage';
		if (open) this.opened++;
	}
	get mayEdit(): boolean {
		return this.desk.may('territories.edit') && (!this.proposal || this.proposal.give !== null);
	}

	#colourSoon() {
		this.inksToday.askSoon(() => ({
			keys: this.entries.map(({ key }) => key),
			borders: territoryBorders(this.desk.countedBorders, this.today, this.entries.length),
			most: this.desk.draft.document.palette.inks.length,
		}));
	}
}
