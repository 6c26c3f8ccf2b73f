import type { Drawing, DrawnText, ShapeLayer } from '../../sheet/index.ts';
import { shapeLayersOver, shapeLayersTop, shapeLayersUnder, shapesIn } from '../../sheet/shapes.ts';
import type { Glyph, Letters } from '../letters/glyph-paths.ts';
import { haloOperators } from './halos.ts';
import { lineWords, shapeWords, textWords } from './layer-words.ts';
import type { PdfLayers } from './layers.ts';
import { decimal, pointsPerUnit } from './numbers.ts';
import { fillParts, lineOperators, rectOperators, shapeParts } from './operators.ts';
import type { SheetDocument } from './sheet-document.ts';

type Content = ReturnType<SheetDocument['markStructureContent']>;

/** Paints a drawing's layers from the bottom up and keeps what the structure tree has to name. */
export class PdfPainter {
	readonly contents: { figure: Content[]; texts: { tag: 'H1' | 'P'; content: Content }[] } = {
		figure: [],
		texts: [],
	};
	readonly #glyphs = new Map<Glyph, string>();

	constructor(
		private readonly document: SheetDocument,
		private readonly drawing: Drawing,
		private readonly layers: PdfLayers,
		private readonly letters: Letters,
	) {}

	paint(): void {
		const { drawing } = this;
		this.#shapes(shapeLayersUnder);
		this.#figure('Fills', fillParts(drawing));
		this.#shapes(shapeLayersOver);
		this.#nameHalos();
		for (const line of drawing.lines) {
			this.#figure(lineWords(line.rank), [lineOperators(drawing, line)]);
		}
		this.#shapes(shapeLayersTop.filter((layer) => layer !== 'legend'));
		for (const layer of ['graticule', 'water', 'label'] as const) this.#names(layer);
		this.#figure('Collar', drawing.rects.map(rectOperators));
		this.#shapes(['legend']);
		for (const layer of ['title', 'collar', 'legend', 'block'] as const) this.#sentences(layer);
	}

	#shapes(layers: readonly ShapeLayer[]): void {
		for (const layer of layers) {
			this.#figure(shapeWords[layer], shapesIn(this.drawing, layer).flatMap(shapeParts));
		}
	}

	/** Part of the figure, in a space of hundredths of a millimetre. */
	#figure(name: string, parts: string[]): void {
		if (!parts.length) return;
		this.layers.within(name, () => {
			this.contents.figure.push(this.document.markStructureContent('Figure'));
			this.#inUnits(parts);
			this.document.endMarkedContent();
		});
	}

	#inUnits(parts: string[]): void {
		const scale = pointsPerUnit.toFixed(8);
		this.document.operators(`q ${scale} 0 0 ${scale} 0 0 cm 4 M`);
		for (const part of parts) this.document.operators(part);
		this.document.operators('Q');
	}

	/** Under the border lines, which stay whole where a name goes over one. */
	#nameHalos(): void {
		const names = this.drawing.texts.filter(({ layer, halo }) => layer === 'label' && halo);
		if (names.length) this.layers.within(textWords.label, () => this.#halos(names));
	}

	/** Texts on the map belong to the figure; their halos are none of its content. */
	#names(layer: DrawnText['layer']): void {
		const texts = this.drawing.texts.filter((text) => text.layer === layer);
		if (!texts.length) return;
		this.layers.within(textWords[layer], () => {
			if (layer !== 'label') this.#halos(texts);
			this.contents.figure.push(this.document.markStructureContent('Figure'));
			texts.forEach((text) => this.#set(text));
			this.document.endMarkedContent();
		});
	}

	#sentences(layer: DrawnText['layer']): void {
		const texts = this.drawing.texts.filter((text) => text.layer === layer);
		if (!texts.length) return;
		this.layers.within(textWords[layer], () => {
			this.#halos(texts);
			texts.forEach((text, place) => {
				const tag = layer === 'title' && place === 0 ? 'H1' : 'P';
				const content = this.document.markStructureContent(tag);
				this.#set(text);
				this.document.endMarkedContent();
				this.contents.texts.push({ tag, content });
			});
		});
	}

	#halos(texts: DrawnText[]): void {
		const parts = texts
			.filter(({ halo }) => halo)
			.map((text) => haloOperators(text, this.letters, this.#glyphs))
			.filter((part) => part !== '');
		if (!parts.length) return;
		this.document.markContent('Artifact', { type: 'Layout' });
		this.#inUnits(parts);
		this.document.endMarkedContent();
	}

	#set({ face, size, hex, text, x, y, spacing = 0 }: DrawnText): void {
		this.document.font(face, size * pointsPerUnit).fillColor(hex);
		const apart = spacing ? { characterSpacing: spacing * pointsPerUnit } : {};
		const options = { lineBreak: false, baseline: 'alphabetic', ...apart } as const;
		this.document.text(text, Number(decimal(x * pointsPerUnit)), y * pointsPerUnit, options);
	}
}
