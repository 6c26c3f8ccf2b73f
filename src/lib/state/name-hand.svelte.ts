import type { DrawnText } from '$lib/engines/sheet/drawing';
import { noAnchor } from '$lib/engines/sheet/labels/set-name';
import type { PlacedName } from '$lib/engines/sheet/layout/lettering';
import type { ColumnValues } from '$lib/schemas/column-values';
import type { Desk } from './desk.svelte';
import { nameBoxes, type NameBox } from './name-boxes';
import { abbreviate, hideNames, letNames, placeName } from './name-edits';

/** The names of a sheet in somebody's hand, while its layout is open: moved, hidden, abbreviated. */
export class NameHand {
	/** whether the layout is open, where names can be moved */
	open = $state(false);
	/** a name that the pointer drags: its region and how far it has come, hundredths of a millimetre */
	dragged: { region: number; dx: number; dy: number } | null = $state.raw(null);
	/** for the live region: what the last gesture came to */
	spoken = $state('');
	/** names as a column of the boundary file has them; null: the sheet's own */
	named: (string | null)[] | null = $state.raw(null);
	/** why they could not be fetched; '' while all is well */
	trouble = $state('');
	#column: string | null = null;
	#boxes: { of: readonly DrawnText[]; boxes: Map<number, NameBox> } | null = null;

	constructor(private readonly desk: Desk) {}

	get may(): boolean {
		return this.open && this.desk.may('layout.edit') && this.#layout.labels;
	}
	get #layout() {
		return this.desk.draft.document.layout;
	}
	get lettering() {
		return this.#layout.lettering;
	}
	keyOf = (region: number): string => this.desk.sheet.regions.key[region];

	/** Fetches the names of a column of the boundary file; null goes back to the sheet's own. */
	async takeFrom(column: string | null): Promise<void> {
		if (column === this.#column) return;
		this.#column = column;
		await this.tryAgain();
	}

	/** Fetches them once more, after they could not be. */
	async tryAgain(): Promise<void> {
		const column = this.#column;
		this.trouble = '';
		if (column === null) {
			this.named = null;
			return;
		}
		const values = await this.#fetched(column);
		if (this.#column !== column) return;
		this.named = values;
		if (!values)
			this.trouble = `The column ${column} could not be fetched; names are the sheet’s own.`;
	}

	/** Null where nothing came, or something else than a value for each region. */
	async #fetched(column: string): Promise<(string | null)[] | null> {
		const query = `name=${encodeURIComponent(column)}`;
		try {
			const response = await fetch(`${this.desk.address}/column?${query}`);
			const { values } = (response.ok ? await response.json() : {}) as Partial<ColumnValues>;
			return values?.length === this.desk.sheet.regions.key.length ? values : null;
		} catch {
			return null;
		}
	}

	/** Where the name of a region stands as drawn; null for one that is not on the sheet. */
	boxOf(region: number): NameBox | null {
		return this.#drawnBoxes().get(region) ?? null;
	}

	/** The region whose name is at a place of the paper; -1 for none. */
	at(x: number, y: number): number {
		for (const [region, box] of this.#drawnBoxes())
			if (x >= box.left && x <= box.right && y >= box.top && y <= box.bottom) return region;
		return -1;
	}

	#drawnBoxes(): Map<number, NameBox> {
		const texts = this.desk.drawn?.drawing.texts ?? [];
		if (this.#boxes?.of === texts) return this.#boxes.boxes;
		const boxes = nameBoxes(texts);
		this.#boxes = { of: texts, boxes };
		return boxes;
	}

	/** How a name stands now, by hand or by itself; null for a region that is not drawn. */
	placeOf(region: number): PlacedName | null {
		const own = this.lettering.placed[this.keyOf(region)];
		if (own) return own;
		const drawing = this.desk.drawn?.drawing;
		if (!drawing) return null;
		const { anchors, short, how } = drawing.lettering;
		const [x, y] = [anchors[2 * region], anchors[2 * region + 1]];
		if (x === noAnchor) return null;
		const box = this.boxOf(region);
		if (!box || how[region] === 'number') return { dxMm: 0, dyMm: 0, lines: null, short: false };
		const lines = drawing.texts.filter((text) => text.layer === 'label' && text.region === region);
		return {
			dxMm: inMm((box.left + box.right) / 2 - x),
			dyMm: inMm((box.top + box.bottom) / 2 - y),
			lines: ([1, 2, 3] as const)[lines.length - 1] ?? null,
			short: short[region] === 1,
		};
	}

	/** Moves a name by millimetres; small moves after one another are one step to undo. */
	move(region: number, dxMm: number, dyMm: number): void {
		const place = this.placeOf(region);
		const name = this.desk.nameOf(region);
		if (!place) {
			this.spoken = `${name} is not drawn at this scale, so its name cannot be placed.`;
			return;
		}
		const next = { ...place, dxMm: tidy(place.dxMm + dxMm), dyMm: tidy(place.dyMm + dyMm) };
		this.set(region, next, `move the name of ${name}`);
		this.spoken = `${name}: ${next.dxMm} mm across, ${next.dyMm} mm down from its region.`;
	}

	set(region: number, place: PlacedName, label: string): void {
		this.desk.draft.change(label, placeName(this.keyOf(region), place), true);
	}

	let(regions: readonly number[]): void {
		const label = `set ${this.#words(regions)} by itself again`;
		this.desk.draft.change(label, letNames(regions.map(this.keyOf)));
	}

	hide(regions: readonly number[]): void {
		this.desk.draft.change(`hide ${this.#words(regions)}`, hideNames(regions.map(this.keyOf)));
	}

	abbreviate(region: number, text: string): void {
		const label = `abbreviate ${this.desk.nameOf(region)}`;
		this.desk.draft.change(label, abbreviate({ [this.keyOf(region)]: text }), true);
	}

	#words(regions: readonly number[]): string {
		return regions.length === 1
			? `the name of ${this.desk.nameOf(regions[0])}`
			: `${regions.length} names`;
	}
}

const inMm = (units: number): number => tidy(units / 100);
const tidy = (mm: number): number => Math.round(mm * 100) / 100;
