import type { DrawnText } from '$lib/engines/sheet/drawing';
import { noAnchor } from '$lib/engines/sheet/labels/set-name';
import type { PlacedName } from '$lib/engines/sheet/layout/lettering';
import type { Desk } from './desk.svelte';
import { abbreviate, hideNames, letNames, placeName } from './name-edits';

/** A box on the paper, in hundredths of a millimetre. */
export interface NameBox {
	left: number;
	top: number;
	right: number;
	bottom: number;
}

/** Parts of the type size above and below a baseline. */
const [rise, drop] = [0.74, 0.23];

/** The names of a sheet in somebody's hand, while its layout is open: moved, hidden, abbreviated. */
export class NameHand {
	/** whether the layout is open, where names can be moved */
	open = $state(false);
	/** a name that the pointer drags: its region and how far it has come, hundredths of a millimetre */
	dragged: { region: number; dx: number; dy: number } | null = $state.raw(null);
	/** for the live region: what the last gesture came to */
	spoken = $state('');
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
		const boxes = new Map<number, NameBox>();
		for (const { layer, region, x, y, width, size } of texts) {
			if (layer !== 'label' || region === undefined) continue;
			const box = { left: x, top: y - rise * size, right: x + width, bottom: y + drop * size };
			const whole = boxes.get(region);
			boxes.set(region, whole ? joined(whole, box) : box);
		}
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

const joined = (a: NameBox, b: NameBox): NameBox => ({
	left: Math.min(a.left, b.left),
	top: Math.min(a.top, b.top),
	right: Math.max(a.right, b.right),
	bottom: Math.max(a.bottom, b.bottom),
});
const inMm = (units: number): number => tidy(units / 100);
const tidy = (mm: number): number => Math.round(mm * 100) / 100;
