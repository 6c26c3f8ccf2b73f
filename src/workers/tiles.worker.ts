import {
	paintArea,
	type DrawnShape,
	type Ground,
	type LineLayer,
	type Pen,
} from '$lib/engines/sheet';
import { areaOf, type Spot } from '$lib/components/desk/canvas/tile-grid';
import type { TileOrder, TileReply } from '$lib/components/desk/canvas/tile-messages';

/** Paints tiles of a large sheet off the page's thread, one after the other, those wanted last. */
let ground: Ground | null = null;
let lines: LineLayer[] = [];
let shapes: DrawnShape[] = [];
let look: Extract<TileOrder, { kind: 'look' }> | null = null;
let version = 0;
let wanted: Spot[] = [];
let painting = false;

function paint(spot: Spot): void {
	if (!ground || !look) return;
	const canvas = new OffscreenCanvas(spot.width, spot.height);
	const pen = canvas.getContext('2d', { alpha: false });
	if (!pen) throw new Error('this browser gives no canvas to paint on');
	const { colours, outline } = look;
	const picture = { ground, lines, shapes, colours, outline };
	paintArea(pen as unknown as Pen, picture, areaOf(spot), spot.scale);
	const bitmap = canvas.transferToImageBitmap();
	self.postMessage({ spot, version, bitmap } satisfies TileReply, { transfer: [bitmap] });
}

async function paintWanted(): Promise<void> {
	if (painting) return;
	painting = true;
	for (let spot = wanted.shift(); spot; spot = wanted.shift()) {
		paint(spot);
		// orders that came meanwhile are heard between two tiles
		await new Promise((resolve) => setTimeout(resolve));
	}
	painting = false;
}

self.onmessage = async ({ data }: MessageEvent<TileOrder>) => {
	if (data.kind === 'want') return want(data.spots);
	if (data.kind === 'ground') ({ ground, lines, shapes } = data);
	else look = data;
	version = data.version;
};

async function want(spots: Spot[]): Promise<void> {
	wanted = spots;
	try {
		await paintWanted();
	} catch (error) {
		painting = false;
		const failed = error instanceof Error ? error.message : String(error);
		self.postMessage({ failed } satisfies TileReply);
	}
}
