import type { Colours, Hatching, Outline } from '$lib/engines/sheet';
import type { Drawing } from '$lib/engines/sheet/drawing';

/** Changes of at most so many regions are painted over the tiles while those are made anew. */
const few = 400;

/** How a large sheet looks at the moment, and what of it has changed since it was last shown. */
export class Look {
	outline: Outline | null = null;
	/** regions that tiles may still show in their colour before */
	readonly pending = new Set<number>();
	#hexes: string[] = [];
	#numbers = new Map<string, number>();
	#of: Uint8Array;
	#faded: Uint8Array | null = null;
	#hatching: Hatching | null = null;
	/** regions changed since; null when everything did */
	#changed: Set<number> | null = null;
	#dirty = true;

	constructor({ fills }: Drawing) {
		this.#of = Uint8Array.from(fills, ({ hex }) => this.#number(hex));
	}

	/** A copy, as it is now. */
	get colours(): Colours {
		return {
			hexes: [...this.#hexes],
			of: this.#of.slice(),
			faded: this.#faded,
			hatching: this.#hatching,
		};
	}

	hexOf(region: number): string {
		return this.#hexes[this.#of[region]];
	}

	tint(region: number, hex: string) {
		const number = this.#number(hex);
		if (this.#of[region] === number) return;
		this.#of[region] = number;
		this.#dirty = true;
		this.#changed?.add(region);
		if (this.#changed && this.#changed.size > few) this.#changed = null;
	}

	/** Hatches follow the inks; tiles cut them at the borders that they show. */
	hatch(next: Hatching | null) {
		const before = this.#hatching;
		if (!next && !before) return;
		const alike = JSON.stringify(next?.looks) === JSON.stringify(before?.looks);
		this.#hatching = next;
		if (!alike || !next || !before) return this.#all();
		next.of.forEach((look, region) => {
			if (look === before.of[region]) return;
			this.#dirty = true;
			this.#changed?.add(region);
		});
		if (this.#changed && this.#changed.size > few) this.#changed = null;
	}

	/** Whether anything fades or comes back. */
	fade(stays: ((region: number) => boolean) | null): boolean {
		const faded = stays && Uint8Array.from(this.#of, (_, region) => (stays(region) ? 0 : 1));
		const same =
			faded === this.#faded ||
			(faded && this.#faded && faded.every((one, i) => one === this.#faded?.[i]));
		if (same) return false;
		this.#faded = faded;
		this.#all();
		return true;
	}

	draw(outline: Outline | null): boolean {
		if (!outline && !this.outline) return false;
		this.outline = outline;
		this.#all();
		return true;
	}

	/** What changed since it was last asked: some regions, or all of it (null); nothing is null itself. */
	taken(): { regions: number[] | null } | null {
		if (!this.#dirty) return null;
		const regions = this.#changed && [...this.#changed];
		this.#dirty = false;
		this.#changed = new Set();
		if (regions) for (const region of regions) this.pending.add(region);
		if (!regions || this.pending.size > few) this.pending.clear();
		return { regions };
	}

	/** The tiles show everything. */
	settled() {
		this.pending.clear();
	}

	#all() {
		this.#dirty = true;
		this.#changed = null;
	}

	/** Colours are numbered as they come; a sheet that has seen 255 of them starts again. */
	#number(hex: string): number {
		const known = this.#numbers.get(hex);
		if (known !== undefined) return known;
		if (this.#hexes.length === 255) this.#renumber();
		this.#numbers.set(hex, this.#hexes.length);
		return this.#hexes.push(hex) - 1;
	}

	#renumber() {
		const used = [...new Set(this.#of)];
		const hexes = used.map((number) => this.#hexes[number]);
		this.#of = this.#of.map((number) => used.indexOf(number));
		this.#hexes = hexes;
		this.#numbers = new Map(hexes.map((hex, number) => [hex, number]));
	}
}
