import { booleanPointInPolygon } from '@turf/turf';
import type { Viewport } from '$lib/state/viewport.svelte';
import type { Place } from './surface';

/** a line shorter than this many pixels is a press */
const clickSlack = 5;

export interface LassoHost {
	/** whether a drag that begins now draws a line */
	draws: (event: PointerEvent) => boolean;
	/** pixels of the frame; [] once it has ended */
	online: (line: Place[]) => void;
	onpress: (target: EventTarget | null, at: Place) => void;
	onclose: (line: Place[]) => void;
}

/** A free line drawn with the pointer on the sheet's frame, instead of moving the sheet. */
export const lasso = (host: LassoHost) => (frame: HTMLElement) => {
	let line: Place[] | null = null;
	const place = ({ clientX, clientY }: PointerEvent): Place => {
		const box = frame.getBoundingClientRect();
		return [clientX - box.left, clientY - box.top];
	};

	function down(event: PointerEvent) {
		const onControl = event.target instanceof Element && event.target.closest('button, a');
		if (event.button !== 0 || onControl || !host.draws(event)) return;
		event.stopImmediatePropagation();
		event.preventDefault();
		line = [place(event)];
	}

	function move(event: PointerEvent) {
		if (!line) return;
		event.stopImmediatePropagation();
		if (!frame.hasPointerCapture(event.pointerId)) frame.setPointerCapture(event.pointerId);
		const [lastX, lastY] = line[line.length - 1];
		const [x, y] = place(event);
		if (Math.hypot(x - lastX, y - lastY) < 2) return;
		line.push([x, y]);
		host.online([...line]);
	}

	function up(event: PointerEvent) {
		if (!line) return;
		event.stopImmediatePropagation();
		const drawn = line;
		line = null;
		host.online([]);
		if (event.type !== 'pointerup') return;
		if (lengthOf(drawn) > clickSlack) return host.onclose(drawn);
		host.onpress(document.elementFromPoint(event.clientX, event.clientY), place(event));
	}

	const first = { capture: true };
	frame.addEventListener('pointerdown', down, first);
	frame.addEventListener('pointermove', move, first);
	frame.addEventListener('pointerup', up, first);
	frame.addEventListener('pointercancel', up, first);
	return () => {
		frame.removeEventListener('pointerdown', down, first);
		frame.removeEventListener('pointermove', move, first);
		frame.removeEventListener('pointerup', up, first);
		frame.removeEventListener('pointercancel', up, first);
	};
};

const lengthOf = (line: readonly Place[]) =>
	line.reduce(
		(sum, [x, y], i) => (i ? sum + Math.hypot(x - line[i - 1][0], y - line[i - 1][1]) : 0),
		0,
	);

/** Regions whose anchor (hundredths of a millimetre) lies inside a line drawn on the frame. */
export function regionsInside(
	line: readonly Place[],
	view: Pick<Viewport, 'x' | 'y' | 'scale' | 'paperWidth' | 'paperHeight'>,
	paper: { widthMm: number; heightMm: number },
	anchors: ArrayLike<number>,
): number[] {
	if (line.length < 3) return [];
	const ring = line.map(([x, y]) => [
		((x - view.x) / (view.paperWidth * view.scale)) * paper.widthMm * 100,
		((y - view.y) / (view.paperHeight * view.scale)) * paper.heightMm * 100,
	]);
	const area = { type: 'Polygon' as const, coordinates: [[...ring, ring[0]]] };
	const inside: number[] = [];
	for (let region = 0; region < anchors.length / 2; region++)
		if (booleanPointInPolygon([anchors[2 * region], anchors[2 * region + 1]], area))
			inside.push(region);
	return inside;
}
