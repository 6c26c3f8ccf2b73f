import { date } from '$lib/components/format';
import type { Area, Ground, SheetTheme } from '$lib/engines/sheet';
import type { Desk } from './desk.svelte';
import { Drawer, type DrawReply, type Refined } from './drawer';
import { drawnSheet } from './drawn-sheet';
import { unpackFills } from './packed-fills';
import { finerLevel, firstGeometry, levelAddress, showsOnCanvas } from './levels-for';

/** The line that tells a draft from an issue, in the words that the server puts on the sheet. */
export const draftIssue = (lastEdition: number | undefined, revision: number, savedAt: string) =>
	lastEdition === undefined
		? `Draft ${revision}, ${date(savedAt)}`
		: `Draft after edition ${lastEdition}, ${date(savedAt)}`;

/** Lines as fine as the screen can show, for the part of the sheet that is looked at. */
export interface FinerGround {
	area: Area;
	address: string;
	ground: Ground;
}

/** Draws the desk's sheet in a worker; asked again whenever the layout changes. */
export function drawInto(desk: Desk, makeWorker: () => Worker) {
	const whole = (path: string) => new URL(path, location.href).href;
	const drawer = new Drawer(makeWorker, (reply: DrawReply) => {
		if ('failed' in reply) desk.drawFailure = reply.failed;
		else if ('refined' in reply) desk.finer = finerOf(reply);
		else if (!('drawing' in reply)) {
			desk.drawn?.learn(reply.borderArcs);
			desk.sizesMm = reply.sizesMm;
		} else {
			const { sizesMm, fills, ...drawn } = reply;
			const { drawing } = drawn;
			if (fills) drawn.drawing = { ...drawing, fills: unpackFills(fills, desk.sheet.regions) };
			desk.drawFailure = '';
			desk.finer = null;
			desk.drawn = drawnSheet(drawn);
			if (sizesMm) desk.sizesMm = sizesMm;
		}
	});
	return {
		draw() {
			const { layout, palette } = desk.shown;
			const { regions, borders, findings, editions, boundarySet } = desk.sheet;
			const inks = palette.inks;
			drawer.ask({
				geometry: whole(firstGeometry(desk.address, boundarySet)),
				onCanvas: showsOnCanvas(boundarySet),
				input: {
					layout: { ...layout },
					inks: inks.map((ink) => ({ ...ink })),
					borders,
					groups: regions.group,
					named: desk.names.named,
					colouring: desk.inks.some((ink) => ink >= 0)
						? desk.inks.map((ink) => (ink < inks.length ? ink : -1))
						: null,
					theme: desk.theme.shown && unwrapped(desk.theme.shown),
					reader: 'typical',
					weak: layout.lines.doubleWeak ? [...desk.palette.weak] : [],
					issue: draftIssue(editions[0]?.number, desk.draft.revision, desk.draft.savedAt),
				},
				places: Float64Array.from(findings.flatMap(({ at }) => at ?? [0, 0])),
			});
		},
		/** Asks for finer lines where they are wanted at so many pixels to a hundredth of a millimetre. */
		refine(area: Area, pixelsPerUnit: number) {
			if (!desk.drawn?.ground) return;
			const { levels } = desk.sheet.boundarySet;
			const level = finerLevel(levels, pixelsPerUnit * desk.drawn.unitsPerMetre);
			const address = level && whole(levelAddress(desk.address, level));
			if (!address || (desk.finer?.address === address && holds(desk.finer.area, area))) return;
			drawer.refine({ finer: address, area: aroundIt(area) });
		},
		stop: () => drawer.stop(),
	};
}

/** Plain values, which can be sent to a worker. */
const unwrapped = ({ inks, ...theme }: SheetTheme): SheetTheme => ({
	...theme,
	inks: inks.map((ink) => ({ ...ink })),
});

const finerOf = ({ area, finer, refined }: Refined): FinerGround => ({
	area,
	address: finer,
	ground: refined,
});

const holds = (outer: Area, inner: Area) =>
	outer.left <= inner.left &&
	outer.top <= inner.top &&
	outer.right >= inner.right &&
	outer.bottom >= inner.bottom;

/** Half as much again on every side, so that a short move asks for nothing. */
function aroundIt({ left, top, right, bottom }: Area): Area {
	const [across, down] = [(right - left) / 2, (bottom - top) / 2];
	return { left: left - across, top: top - down, right: right + across, bottom: bottom + down };
}
