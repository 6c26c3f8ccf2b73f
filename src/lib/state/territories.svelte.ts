import type { BorderList } from '$lib/engines/borders/border-list';
import { tornParts } from '$lib/engines/territories';
import type { TerritoryDraft, TerritoryEntry } from '$lib/engines/territories/territory-draft';
import type { DeskTerritories } from '$lib/schemas/desk-territories';
import { Colourer, type ColourReply } from './colourer';
import type { Desk } from './desk.svelte';
import { DraftState } from './draft.svelte';
import type { Keeper } from './kept-drafts';
import { judgePalette } from './palette-judgement';
import { rebaseTerritories } from './rebase-territories';
import type { SaveDraft } from './save-draft';
import { HandOut } from './hand-out.svelte';
import {
	inksByNumber,
	sameBorders,
	territoryBorders,
	territoryColouring,
} from './territory-colours';
import { countRegions, figureOf, isOutside, loadsOf } from './territory-figures';
import { asTerritories, assignmentOf, joinedRegions, numberTerritories } from './territory-numbers';
import { roomSentence } from './territory-words';

/** What the server answers when the territories were saved. */
export interface TerritoriesSaved {
	revision: number;
	savedAt: string;
	/** ink number of each territory, by key */
	inks: Record<string, number>;
}

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

	/** a proposal on the sheet, or null for today's territories */
	proposal: PlanOnShow | null = $state.raw(null);
	/** the one territory looked at, by key */
	chosen: string | null = $state(null);
	/** measures in the tables beside those with a tolerance, by id */
	measuresPicked: readonly string[] = $state.raw([]);
	/** inks of today's territories, by key, as far as they are known */
	inksToday: Readonly<Record<string, number>> = $state.raw()!;
	/** why neighbouring territories could not be told apart; '' while all is well */
	inkTrouble = $state('');

	document = $derived.by(() => this.draft.document);
	entries = $derived(this.document.territories);
	numbers = $derived(numberTerritories(this.entries));
	#handedOut = $derived(this.document.assignment);
	today = $derived.by(() =>
		assignmentOf(this.#handedOut, this.desk.sheet.regions.key, this.numbers),
	);
	assignment = $derived(this.proposal?.assignment ?? this.today);
	inks = $derived(
		inksByNumber(
			this.entries.map(({ key }) => key),
			this.proposal?.inks ?? this.inksToday,
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
	graph = $derived.by(() =>
		joinedRegions(this.desk.sheet.borders, this.desk.numbers, this.#waterLinks, this.#handLinks),
	);
	shares = $derived.by(() => asTerritories(this.entries, this.desk.numbers));
	figures = $derived.by(() => {
		const tolerances = this.#tolerances;
		const ids = new Set([...Object.keys(tolerances), ...this.measuresPicked]);
		const { measures } = this.given;
		const picked = measures.filter(({ id }) => ids.has(id));
		const shown = picked.length ? picked : measures.slice(0, 1);
		return shown.map((measure) => figureOf(measure, tolerances[measure.id]));
	});
	/** what the plan comes to, for each of `figures` */
	loads = $derived(this.figures.map(({ values }) => loadsOf(values, this.assignment, this.shares)));
	counts = $derived(countRegions(this.assignment, this.entries.length));
	torn = $derived(
		tornParts(this.graph, this.assignment, this.shares, this.figures[0]?.values ?? null),
	);
	/** territories outside some tolerance */
	outside = $derived(
		this.entries.flatMap((_, t) =>
			this.figures.some(({ tolerance }, m) => isOutside(this.loads[m].deviation[t], tolerance))
				? [t]
				: [],
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
		const { before } = this.proposal ?? {};
		if (!before) return [];
		return Array.from(this.assignment.keys()).filter((r) => this.assignment[r] !== before[r]);
	});
	borders = $derived.by(() =>
		territoryBorders(
			this.desk.sheet.borders,
			this.desk.standing,
			this.assignment,
			this.entries.length,
		),
	);
	/** territories whose ink differs from the one last saved */
	changedInks = $derived(
		this.entries.filter(
			({ key }) => key in this.given.inks && this.inksToday[key] !== this.given.inks[key],
		),
	);
	palette = $derived.by(() =>
		judgePalette(
			this.desk.draft.document.palette.inks,
			this.inks,
			this.borders,
			new Array<'counts'>(this.borders.a.length).fill('counts'),
			null,
		),
	);

	#colourer: Colourer | null = null;
	#asked: { borders: BorderList; territories: readonly TerritoryEntry[] } | null = null;
	#askedKeys: string[] = [];
	#soon: ReturnType<typeof setTimeout> | undefined;

	constructor({ given, save, keeper, desk }: TerritoryStart) {
		this.desk = desk;
		this.given = given;
		this.inksToday = given.inks;
		this.draft = new DraftState({
			place: `${desk.sheet.id} territories`,
			revision: given.revision,
			document: given.draft,
			savedAt: given.savedAt ?? new Date().toISOString(),
			save,
			keeper,
			rebase: rebaseTerritories,
			onchange: () => this.#colourSoon(),
			onsaved: ({ inks }) => this.#adoptSaved(inks),
		});
		this.hand = new HandOut(this);
	}

	/** In the browser: the worker that finds inks for the territories after each change. */
	work(makeWorker: () => Worker): () => void {
		this.#colourer = new Colourer(makeWorker, (reply) => this.#settle(reply));
		if (this.#allInked) this.#asked = { borders: this.borders, territories: this.entries };
		this.#colourSoon();
		return () => {
			clearTimeout(this.#soon);
			this.#colourer?.stop();
			this.#colourer = null;
			this.#asked = null;
		};
	}

	/** The page was loaded again, after measures were joined or somebody else saved. */
	refresh(given: DeskTerritories) {
		const newer = given.revision > this.draft.revision && !this.draft.dirty;
		this.given = given;
		this.draft.refresh(given.revision, given.draft, given.savedAt ?? this.draft.savedAt);
		if (newer) this.inksToday = given.inks;
	}

	entry(key: string | null): TerritoryEntry | null {
		return this.entries[this.numbers.get(key ?? '') ?? -1] ?? null;
	}
	/** the territory of a region, or null */
	of(region: number): TerritoryEntry | null {
		return this.entries[this.assignment[region]] ?? null;
	}
	get mayEdit(): boolean {
		return this.desk.may('territories.edit') && (!this.proposal || this.proposal.give !== null);
	}

	get #allInked() {
		return this.entries.every(({ key }) => key in this.inksToday);
	}

	#colourSoon() {
		clearTimeout(this.#soon);
		if (this.#colourer) this.#soon = setTimeout(() => this.#colour(), 0);
	}

	#colour() {
		if (this.proposal) return;
		const { borders, entries } = this;
		if (
			this.#allInked &&
			entries === this.#asked?.territories &&
			sameBorders(this.#asked.borders, borders)
		)
			return;
		this.#asked = { borders, territories: entries };
		this.#askedKeys = entries.map(({ key }) => key);
		if (!entries.length) return;
		const previous = inksByNumber(this.#askedKeys, this.given.inks);
		this.#colourer?.ask(territoryColouring(entries.length, borders, previous));
	}

	#settle(reply: ColourReply) {
		if ('failed' in reply || reply.result.status !== 'coloured') {
			this.inkTrouble = 'No inks could be found for the territories: the last ones stay.';
			return;
		}
		const { colouring } = reply.result;
		this.inkTrouble = '';
		this.inksToday = Object.fromEntries(this.#askedKeys.map((key, t) => [key, colouring[t]]));
	}

	#adoptSaved(inks: Record<string, number>) {
		this.given = { ...this.given, inks };
		if (!this.draft.dirty) this.inksToday = inks;
	}
}
