import { getContext, setContext, type Snippet } from 'svelte';
import { bordersForSheet, kindCode, standingsForSheet } from '$lib/engines/borders';
import type { ColouringProblem, ColouringResult } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { Area } from '$lib/engines/sheet';
import { isOnSheet } from '$lib/engines/sheet/labels/set-name';
import type { Reader } from '$lib/engines/palettes/palette';
import type { DeskColouring, DeskSheet, DraftSaved } from '$lib/schemas/desk';
import type { DeskTerritories } from '$lib/schemas/desk-territories';
import { BorderRules } from './border-rules.svelte';
import { ColouringOnDesk } from './colouring-on-desk.svelte';
import type { FinerGround } from './desk-drawing';
import { DraftState } from './draft.svelte';
import type { Evidence } from './evidence';
import { Flatness } from './flatness.svelte';
import { inkUse } from './ink-use';
import { keeperWithInks, type Keeper } from './kept-drafts';
import { NameHand } from './name-hand.svelte';
import { OnTrial } from './on-trial.svelte';
import { judgePalette, numbersIn, type PaletteJudgement } from './palette-judgement';
import { problemOf } from './problem-of-draft';
import { rebase } from './rebase';
import { linkRegions, neighboursOf } from './region-links';
import { numberRegions } from './rules-in-force';
import type { SaveWithInks } from './save-draft';
import type { ShownFirst } from './first-picture';
import type { DrawnSheet } from './drawn-sheet';
import { RuleHand } from './rule-hand.svelte';
import { ThemeOnDesk } from './theme-on-desk.svelte';
import { TerritoryDesk, type PlanOnShow, type TerritoryStart } from './territories.svelte';

export interface DeskStart {
	sheet: DeskSheet;
	/** where the sheet's pages are: /team/sheets/12 */
	address: string;
	/** name that goes with a lock */
	userName: string | null;
	/** sends the colouring with it where the server would find another */
	save: SaveWithInks;
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

	readonly colouring: ColouringOnDesk;
	/** another document and its colouring, shown for a while */
	readonly trial = new OnTrial(({ label, document, answer, inks, arranges }) => {
		// an arrangement of the same document is a document of its own, with other inks remembered for it
		const kept = { ...(arranges ? this.draft.document : document) };
		this.colouring.know(kept, answer, inks);
		this.draft.change(label, () => kept);
	});
	/** what the hand holds while rules are made */
	readonly rules = new RuleHand(this);
	/** the names of the sheet, moved and hidden by hand while the layout is open */
	readonly names = new NameHand(this);
	/** whether the borders that count can be drawn in a plane */
	readonly flatness: Flatness;
	drawn: DrawnSheet | null = $state.raw(null);
	/** what a large sheet shows until it is painted from `drawn`; null for others, and afterwards */
	first: ShownFirst | null = $state.raw(null);
	/** finer lines for the part of the sheet that is looked at, on a canvas */
	finer: FinerGround | null = $state.raw(null);
	/** asks for them: an area of the paper, and pixels to a hundredth of a millimetre */
	refine: ((area: Area, pixelsPerUnit: number) => void) | null = null;
	/** how large each region shows, mm; null until it has been measured */
	sizesMm: Float64Array | null = $state.raw(null);
	/** why the sheet could not be drawn here; '' while all is well */
	drawFailure = $state('');

	numbers = $derived(numberRegions(this.sheet.regions.key));
	readonly borderRules = new BorderRules(() => this.draft.document);
	standing = $derived.by(() =>
		standingsForSheet(this.sheet.regions.key, this.sheet.borders, this.borderRules.now),
	);
	/** the borders that ask for two inks, those added by hand among them */
	countedBorders = $derived.by(() => {
		const { regions, borders } = this.sheet;
		return bordersForSheet(regions.key, borders, this.borderRules.now);
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
	/** the document that the sheet shows: what is on trial, or the draft */
	shown: Draft = $derived.by(() => this.trial.now?.document ?? this.draft.document);
	/** its colouring: the last one that kept every rule; -1 where there is none */
	inks: Int32Array = $derived.by(() => this.trial.now?.inks ?? this.colouring.inks);
	/** number in the sheet's list of each border that counts */
	countedNumbers = $derived.by(() => numbersIn(this.sheet.borders, this.countedBorders));
	palette = $derived.by(() => this.judge(this.shown, this.inks));
	/** what is planned on the sheet now, when it is territories */
	planning = $derived(this.byTerritory ? this.territories : null);
	/** the measure that the sheet shows in place of its colouring */
	readonly theme = new ThemeOnDesk(this);
	/** what the sheet paints: the ink of every region, of its territory, or its class of a measure */
	paints = $derived.by(() => this.planning?.regionInks ?? this.theme.shown?.classes ?? this.inks);
	/** the inks that these numbers name */
	shownInks = $derived.by(() => this.theme.shown?.inks ?? this.shown.palette.inks);
	uses = $derived.by(() => inkUse(this.paints, this.sheet.regions.areaKm2, this.shownInks.length));

	constructor(start: DeskStart) {
		const { sheet } = start;
		this.sheet = sheet;
		this.address = start.address;
		this.flatness = new Flatness(sheet.boundarySet.planar);
		this.userName = start.userName;
		this.colouring = new ColouringOnDesk({
			document: sheet.draft,
			answer: sheet.colouring,
			lastInks: sheet.lastInks,
			regions: sheet.regions.key.length,
			problem: (document, previous) => this.problemOf(document, previous),
			afresh: ({ seed }) => seed !== this.draft.base.seed,
			sentence: (result, document) => start.sentence(result, this.sheet, document),
			onsettled: () => this.draft.keepNow(),
		});
		this.draft = new DraftState({
			place: sheet.id,
			revision: sheet.revision,
			document: sheet.draft,
			savedAt: sheet.savedAt,
			save: (revision, document) => start.save(revision, document, this.colouring.toSave(document)),
			keeper: start.keeper && keeperWithInks(start.keeper, this.colouring),
			rebase,
			onchange: (document) => {
				this.trial.drop();
				if (this.colouring.follow(document)) this.evidence = null;
			},
			onsaved: ({ colouring }) => this.#adoptSaved(colouring),
		});
	}

	/** What is asked of the colouring engine for a draft of this sheet, staying near to `previous`. */
	problemOf(document: Draft, previous: Int32Array | null): ColouringProblem {
		const { borders, regions } = this.sheet;
		return problemOf(document, regions.key, borders, this.numbers, previous);
	}

	/** How the palette of a document, or the colours of classes, fare on this sheet with a colouring. */
	judge(
		{ palette, layout }: { palette: Pick<Draft['palette'], 'inks'>; layout: Draft['layout'] },
		colouring: Int32Array,
	): PaletteJudgement {
		return judgePalette({
			...{ inks: palette.inks, colouring, borders: this.countedBorders },
			...{ numbers: this.countedNumbers, sizesMm: this.sizesMm },
			...{ groups: this.sheet.regions.group, labelled: this.#labelled(layout) },
			lines: {
				region: layout.lines.region?.hex ?? '#000000',
				group: layout.lines.group?.hex ?? '#000000',
			},
		});
	}

	/** Which regions the sheet itself names, as it was drawn last. */
	#labelled({ labels }: Draft['layout']): ((region: number) => boolean) | undefined {
		const how = this.drawn?.drawing.lettering.how;
		return labels && how ? (region) => isOnSheet(how[region]) : undefined;
	}

	/** what is known about the draft as it stands */
	get answer(): DeskColouring | null {
		return this.colouring.answer;
	}
	get working(): boolean {
		return this.colouring.working;
	}
	get failure(): string {
		return this.colouring.failure;
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
		const rest = this.colouring.work(makeWorker);
		return () => {
			rest();
			this.draft.stop();
		};
	}

	/** Once the sheet can be worked on: has the engine run, so that the first lock is answered at once. */
	rehearse() {
		if (this.may('colours.edit')) this.colouring.rehearse(this.draft.document);
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
		this.colouring.stop();
	}

	#adoptSaved(answer: DeskColouring | null) {
		this.colouring.adoptSaved(answer, this.draft.document, this.draft.dirty);
	}
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
