import { getContext, setContext, type Snippet } from 'svelte';
import {
	bordersForSheet,
	kindCode,
	standingsForSheet,
	type ReasonedRules,
} from '$lib/engines/borders';
import type { ColouringResult } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { Area } from '$lib/engines/sheet';
import type { Reader } from '$lib/engines/palettes/palette';
import type { DeskColouring, DeskSheet, DraftSaved } from '$lib/schemas/desk';
import type { DeskTerritories } from '$lib/schemas/desk-territories';
import { Colourer, type ColourReply } from './colourer';
import type { FinerGround } from './desk-drawing';
import { DraftState } from './draft.svelte';
import type { Evidence } from './evidence';
import { Flatness } from './flatness.svelte';
import { inkUse } from './ink-use';
import type { Keeper } from './kept-drafts';
import { judgePalette } from './palette-judgement';
import { colouringParts, problemOf } from './problem-of-draft';
import { rebase } from './rebase';
import { rehearsals } from './rehearsals';
import { linkRegions, neighboursOf } from './region-links';
import { numberRegions } from './rules-in-force';
import type { SaveDraft } from './save-draft';
import type { DrawnSheet } from './drawn-sheet';
import { TerritoryDesk, type PlanOnShow, type TerritoryStart } from './territories.svelte';

export interface DeskStart {
	sheet: DeskSheet;
	/** where the sheet's pages are: /team/sheets/12 */
	address: string;
	/** name that goes with a lock */
	userName: string | null;
	save: SaveDraft<Draft, DraftSaved>;
	keeper: Keeper<Draft> | null;
	/** says what was found, in one sentence; the engine's own words */
	sentence: (result: ColouringResult, sheet: DeskSheet, draft: Draft) => string;
}

const gap = kindCode('gap');

/** Everything on the desk of one sheet: what the server gave, the draft on top of it, what is selected. */
export class Desk {
	sheet: DeskSheet = $state.raw()!;
	readonly draft: DraftState<Draft, DraftSaved>;
	readonly address: string;
	readonly userName: string | null;

	reader: Reader = $state('typical');
	/** the one selection: a region's number */
	selected: number | null = $state(null);
	evidence: Evidence | null = $state.raw(null);
	/** ink whose regions are pointed out while the strip is hovered or focused */
	pointedInk: number | null = $state(null);
	/** whether every border that some reader could miss stands out on the sheet */
	showWeak = $state(false);
	panel: 'stage' | 'region' = $state('stage');
	view: 'sheet' | 'table' | 'territories' | 'further' = $state('sheet');
	/** a table that the stage lays in the middle, beside those that are always there */
	further: { label: string; content: Snippet } | null = $state.raw(null);
	/** figures looked at beside the regions in their table */
	figures: { name: string; unit: string; values: readonly (number | string | null)[] } | null =
		$state.raw(null);

	/** what the stage of territories works on, once it was opened or looked up */
	territories: TerritoryDesk | null = $state.raw(null);
	/** whether the sheet is coloured by territory */
	byTerritory = $state(false);

	/** what is known about the draft as it stands */
	answer: DeskColouring | null = $state.raw(null);
	/** the last colouring that kept every rule; -1 where there is none */
	inks: Int32Array = $state.raw()!;
	working = $state(false);
	/** the engine ended without an answer: what it said */
	failure = $state('');
	/** whether the borders that count can be drawn in a plane */
	readonly flatness: Flatness;
	drawn: DrawnSheet | null = $state.raw(null);
	/** finer lines for the part of the sheet that is looked at, on a canvas */
	finer: FinerGround | null = $state.raw(null);
	/** asks for them: an area of the paper, and pixels to a hundredth of a millimetre */
	refine: ((area: Area, pixelsPerUnit: number) => void) | null = null;
	/** how large each region shows, mm; null until it has been measured */
	sizesMm: Float64Array | null = $state.raw(null);
	/** why the sheet could not be drawn here; '' while all is well */
	drawFailure = $state('');

	numbers = $derived(numberRegions(this.sheet.regions.key));
	/** the rule for borders, part by part: a lock changes the document and none of these */
	#pointTouches = $derived.by(() => this.draft.document.pointTouches);
	#leastMetres = $derived.by(() => this.draft.document.leastMetres);
	#waterKm = $derived.by(() => this.draft.document.waterKm);
	#struck = $derived.by(() => this.draft.document.struck);
	#added = $derived.by(() => this.draft.document.added);
	borderRules: ReasonedRules = $derived({
		pointTouches: this.#pointTouches,
		leastMetres: this.#leastMetres,
		waterKm: this.#waterKm,
		struck: this.#struck,
		added: this.#added,
	});
	standing = $derived.by(() =>
		standingsForSheet(this.sheet.regions.key, this.sheet.borders, this.borderRules),
	);
	/** the borders that ask for two inks, those added by hand among them */
	countedBorders = $derived.by(() => {
		const { regions, borders } = this.sheet;
		return bordersForSheet(regions.key, borders, this.borderRules);
	});
	/** who lies next to whom; a gap that was only measured joins nobody until it counts */
	links = $derived.by(() => {
		const { regions, borders } = this.sheet;
		const joins = (border: number) =>
			borders.kind[border] !== gap || this.standing[border] === 'counts';
		return linkRegions(regions.key.length, borders, joins);
	});
	neighbours = $derived(
		this.selected === null ? [] : neighboursOf(this.selected, this.sheet.borders, this.links),
	);
	palette = $derived.by(() =>
		judgePalette(
			this.draft.document.palette.inks,
			this.inks,
			this.sheet.borders,
			this.standing,
			this.sizesMm,
		),
	);
	/** what is planned on the sheet now, when it is territories */
	planning = $derived(this.byTerritory ? this.territories : null);
	/** what the sheet paints: the ink of every region, or of its territory */
	paints = $derived(this.planning?.regionInks ?? this.inks);
	uses = $derived.by(() =>
		inkUse(this.paints, this.sheet.regions.areaKm2, this.draft.document.palette.inks.length),
	);

	#start: DeskStart;
	#colourer: Colourer | null = null;
	#asked: readonly unknown[];
	#askedFor: Draft;
	/** the last colouring the server has stored: what it stays near to, and so must we */
	#savedInks: Int32Array | null;
	/** the colouring that belongs to a document, so that undo shows it again at once */
	#known = new WeakMap<Draft, { answer: DeskColouring | null; inks: Int32Array }>();

	constructor(start: DeskStart) {
		this.#start = start;
		this.sheet = start.sheet;
		this.address = start.address;
		this.flatness = new Flatness(start.sheet.boundarySet.planar);
		this.userName = start.userName;
		this.answer = start.sheet.colouring;
		this.#savedInks = start.sheet.lastInks && Int32Array.from(start.sheet.lastInks);
		this.inks = this.#savedInks ?? new Int32Array(start.sheet.regions.key.length).fill(-1);
		this.#askedFor = start.sheet.draft;
		this.#asked = colouringParts(start.sheet.draft);
		this.#remember(start.sheet.draft);
		this.draft = new DraftState({
			place: start.sheet.id,
			revision: start.sheet.revision,
			document: start.sheet.draft,
			savedAt: start.sheet.savedAt,
			save: start.save,
			keeper: start.keeper,
			rebase,
			onchange: (document) => this.#recolour(document),
			onsaved: ({ colouring }) => this.#adoptSaved(colouring),
		});
	}

	/** What the server gave of the territories: the first time it is opened, later it is brought up to date. */
	openTerritories(given: DeskTerritories, start: Omit<TerritoryStart, 'given' | 'desk'>) {
		if (this.territories) this.territories.refresh(given);
		else this.territories = new TerritoryDesk({ ...start, given, desk: this });
	}

	/** the draft that undo, redo and saving speak of */
	get inHand():
		DraftState<Draft, DraftSaved> | TerritoryDesk['draft'] | NonNullable<PlanOnShow['draft']> {
		return this.planning?.proposal?.draft ?? this.planning?.draft ?? this.draft;
	}

	may(action: DeskSheet['rights'][number]): boolean {
		return this.sheet.rights.includes(action);
	}

	/** In the browser: the worker that answers each change. */
	work(makeWorker: () => Worker): () => void {
		this.#colourer = new Colourer(makeWorker, (reply) => this.#settle(reply));
		this.#colourer.warm();
		return () => {
			this.#colourer?.stop();
			this.#colourer = null;
			this.draft.stop();
		};
	}

	/** Once the sheet can be worked on: has the engine run, so that the first lock is answered at once. */
	rehearse() {
		if (!this.may('colours.edit')) return;
		const { borders, regions } = this.sheet;
		const { document } = this.draft;
		const problem = problemOf(document, regions.key, borders, this.numbers, this.#savedInks);
		this.#colourer?.rehearse(rehearsals(problem, this.inks));
	}

	/** The page was loaded again: after a finding was accepted, an edition issued. */
	refresh(sheet: DeskSheet) {
		this.sheet = sheet;
		this.draft.refresh(sheet.revision, sheet.draft, sheet.savedAt);
		if (sheet.colouring && !this.draft.dirty && sheet.revision === this.draft.revision)
			this.#adoptSaved(sheet.colouring);
	}

	select(region: number | null, open = false) {
		this.selected = region;
		if (region === null) this.panel = 'stage';
		else if (open) this.panel = 'region';
	}

	nameOf = (region: number): string =>
		this.sheet.regions.name[region] || this.sheet.regions.key[region];

	/** Stops a colouring that takes long; what is on the sheet stays. */
	stopWorking() {
		this.#colourer?.stop();
		this.working = false;
		this.failure = 'Stopped. The sheet shows the last colouring that kept every rule.';
	}

	#recolour(document: Draft) {
		const known = this.#known.get(document);
		const parts = colouringParts(document);
		const unchanged = parts.every((part, index) => part === this.#asked[index]);
		this.#asked = parts;
		if (known) {
			this.#colourer?.forget();
			this.working = false;
			this.answer = known.answer;
			this.inks = known.inks;
			this.evidence = null;
		} else if (unchanged) {
			if (!this.working) this.#remember(document);
			else this.#askedFor = document;
		} else this.#ask(document);
	}

	#ask(document: Draft) {
		this.#askedFor = document;
		this.working = this.#colourer !== null;
		this.failure = '';
		this.evidence = null;
		const { borders, regions } = this.sheet;
		// another seed asks for another arrangement, so nothing is held to the colouring before
		const from = document.seed === this.draft.base.seed ? this.#savedInks : null;
		this.#colourer?.ask(problemOf(document, regions.key, borders, this.numbers, from));
	}

	#settle(reply: ColourReply) {
		this.working = false;
		if ('failed' in reply) {
			this.failure = `The colouring ended without an answer (${reply.failed}).`;
			return;
		}
		const sentence = this.#start.sentence(reply.result, this.sheet, this.#askedFor);
		this.#adopt(deskColouring(reply.result, sentence), this.#askedFor);
	}

	#adoptSaved(answer: DeskColouring | null) {
		if (answer?.status === 'coloured') this.#savedInks = Int32Array.from(answer.inks);
		if (!this.draft.dirty) this.#adopt(answer, this.draft.document);
	}

	#adopt(answer: DeskColouring | null, document: Draft) {
		if (!answer) return;
		this.answer = answer;
		if (answer.status === 'coloured') this.#showInks(Int32Array.from(answer.inks));
		this.#remember(document);
	}

	#showInks(inks: Int32Array) {
		const same = inks.length === this.inks.length && inks.every((ink, i) => ink === this.inks[i]);
		if (!same) this.inks = inks;
	}

	#remember(document: Draft) {
		this.#known.set(document, { answer: this.answer, inks: this.inks });
	}
}

function deskColouring(result: ColouringResult, sentence: string): DeskColouring {
	if (result.status !== 'coloured') return { ...result, sentence };
	const { inksUsed, lowerBound, proof, colouring } = result;
	return { status: 'coloured', inks: [...colouring], inksUsed, lowerBound, proof, sentence };
}

const place = Symbol('desk');
export const setDesk = (desk: Desk): Desk => setContext(place, desk);
export const getDesk = (): Desk => getContext<Desk>(place);

/** For the places of the territories' stage, which stand only where the territories have been opened. */
export function getPlan(): TerritoryDesk {
	const { territories } = getDesk();
	if (!territories) throw new Error('the territories have not been opened');
	return territories;
}
