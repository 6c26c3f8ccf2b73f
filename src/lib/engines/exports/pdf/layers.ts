import type { PdfReference, SheetDocument } from './sheet-document.ts';

/**
 * Named layers that a viewer can switch off: optional content groups (ISO 32000-1, 8.11). Content is
 * added in the drawing's order; `end` writes the list of layers, topmost first, as viewers show it.
 */
export class PdfLayers {
	readonly #document: SheetDocument;
	readonly #wanted: boolean;
	readonly #groups = new Map<string, { name: string; group: PdfReference }>();

	constructor(document: SheetDocument, wanted: boolean) {
		this.#document = document;
		this.#wanted = wanted;
	}

	/** Adds what `paint` paints to the layer of that name. */
	within(name: string, paint: () => void): void {
		if (!this.#wanted) return paint();
		this.#document.operators(`/OC /${this.#nameOf(name)} BDC`);
		paint();
		this.#document.operators('EMC');
	}

	#nameOf(words: string): string {
		const known = this.#groups.get(words);
		if (known) return known.name;
		const group = this.#document.dictionary({ Type: 'OCG', Name: new String(words) });
		const name = `L${this.#groups.size + 1}`;
		this.#groups.set(words, { name, group });
		return name;
	}

	end(): void {
		if (!this.#groups.size) return;
		const all = [...this.#groups.values()];
		const groups = all.map(({ group }) => group);
		groups.forEach((group) => group.end());
		this.#document.resource(
			'Properties',
			Object.fromEntries(all.map(({ name, group }) => [name, group])),
		);
		this.#document.catalogue('OCProperties', {
			OCGs: groups,
			D: { Name: new String('Layers'), Order: groups.toReversed(), ON: groups },
		});
	}
}
