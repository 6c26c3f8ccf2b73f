import { asSeenBy } from '$lib/engines/colour';
import type { Ink, Reader } from '$lib/engines/palettes/palette';
import { recolour, uncoloured } from '$lib/engines/sheet';
import type { Drawing, RegionFill } from '$lib/engines/sheet/drawing';
import type { Surface } from './surface';

export interface Painting {
	surface: Surface;
	drawing: Drawing;
	palette: readonly Ink[];
	reader: Reader;
	/** ink of every region */
	inks: Int32Array;
	words: (fill: RegionFill, drawing: Drawing) => string;
	/** territory of every region while the sheet is coloured by territory: then changes are painted at once, the rest soon after */
	owners: Int32Array | null;
}

/** milliseconds after the last gesture before lettering, legend and words are set anew */
const soon = 150;

/**
 * Colours the sheet that is on the screen. A gesture on territories changes few regions: those are
 * painted at once whatever the sheet's size, and the whole is set right when the hand rests.
 */
export class SheetPainter {
	#last: Painting | null = null;
	#timer: ReturnType<typeof setTimeout> | undefined;

	paint(next: Painting) {
		const last = this.#last;
		this.#last = next;
		clearTimeout(this.#timer);
		const go = last && next.owners && last.owners ? this.#differing(last, next) : null;
		if (!go) return this.#whole(next);
		const shown = next.palette.map(({ hex }) => asSeenBy(hex, next.reader));
		for (const region of go) {
			const fill = { ...next.drawing.fills[region], ink: next.inks[region] };
			next.surface.tint(region, shown[fill.ink] ?? uncoloured, next.words(fill, next.drawing));
		}
		this.#timer = setTimeout(() => this.#whole(next), soon);
	}

	stop() {
		clearTimeout(this.#timer);
	}

	#whole({ surface, drawing, palette, reader, inks, words }: Painting) {
		const coloured = recolour(drawing, inks, [...palette], reader);
		surface.paint(coloured, (fill) => words(fill, coloured));
	}

	/** regions that changed; null where the whole sheet has to be painted */
	#differing(last: Painting, next: Painting): number[] | null {
		const same = (['surface', 'drawing', 'palette', 'reader'] as const).every(
			(part) => last[part] === next[part],
		);
		if (!same) return null;
		return [...next.inks.keys()].filter(
			(region) =>
				last.inks[region] !== next.inks[region] || last.owners?.[region] !== next.owners?.[region],
		);
	}
}
