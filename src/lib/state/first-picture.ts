import { asSeenBy } from '$lib/engines/colour';
import {
	decodeFirstPicture,
	paintFirstPicture,
	uncoloured,
	type FirstPicture,
} from '$lib/engines/sheet';
import type { DeskSheetApart } from '$lib/schemas/desk';
import { unpackNumbers } from '$lib/schemas/packed-numbers';

/** What a large sheet shows until it is drawn: coarse, of the draft as it was saved, for a typical reader. */
export interface ShownFirst {
	/** a pixel a cell */
	canvas: HTMLCanvasElement;
	grid: Omit<FirstPicture, 'owner' | 'group'>;
}

/** Lays the picture on a canvas: the paper's corner at x, y, so many pixels to a hundredth of a millimetre. */
export function layFirst(
	pen: CanvasRenderingContext2D,
	{ canvas, grid }: ShownFirst,
	paper: { x: number; y: number; scale: number },
) {
	const { scale } = paper;
	pen.imageSmoothingQuality = 'high';
	pen.drawImage(
		canvas,
		paper.x + grid.x * scale,
		paper.y + grid.y * scale,
		grid.columns * grid.cell * scale,
		grid.rows * grid.cell * scale,
	);
}

export const firstPictureAddress = (sheet: string, { firstPicture }: DeskSheetApart): string =>
	`${sheet}/first-picture?tag=${firstPicture}`;

/**
 * Fetches the first picture of a sheet and paints it in the inks that were saved. Null where there is none;
 * the sheet is drawn without it then.
 */
export async function fetchFirstPicture(picture: string, sheet: Inked): Promise<ShownFirst | null> {
	const response = await fetch(picture);
	if (response.status !== 200) return null;
	const { owner, group, ...grid } = decodeFirstPicture(await response.arrayBuffer());
	if (grid.columns * grid.rows === 0) return null;
	const pixels = paintFirstPicture({ owner, group, ...grid }, coloursOf(sheet));
	const canvas = document.createElement('canvas');
	Object.assign(canvas, { width: grid.columns, height: grid.rows });
	const pen = canvas.getContext('2d');
	if (!pen) return null;
	pen.putImageData(new ImageData(pixels, grid.columns, grid.rows), 0, 0);
	return { canvas, grid };
}

type Inked = Pick<DeskSheetApart, 'draft' | 'lastInks' | 'theme'>;

function coloursOf({ draft, lastInks, theme }: Inked) {
	const inks = (theme?.inks ?? draft.palette.inks).map(({ hex }) => asSeenBy(hex, 'typical'));
	const packed = theme?.classes ?? lastInks;
	const numbers = packed === null ? [] : unpackNumbers(packed);
	return (region: number) => inks[numbers[region]] ?? uncoloured;
}
