import type { Viewport } from '$lib/state/viewport.svelte';
import type { Place } from './surface';

/** a press that moves less than this many pixels is a click */
const clickSlack = 5;

/**
 * Wheel, drag and pinch on the sheet's frame. A press that does not move is handed to `onpress` with
 * what lay under it and where. One finger scrolls the page until the sheet is zoomed in.
 */
export const panAndZoom =
	(view: Viewport, onpress: (target: EventTarget | null, at: Place) => void) =>
	(frame: HTMLElement) => {
		const fingers = new Map<number, { x: number; y: number }>();
		let moved = 0;

		const place = (event: PointerEvent | WheelEvent) => {
			const box = frame.getBoundingClientRect();
			return { x: event.clientX - box.left, y: event.clientY - box.top };
		};

		function wheel(event: WheelEvent) {
			event.preventDefault();
			const { x, y } = place(event);
			const lines = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 24 : 1;
			view.zoom(Math.exp(-event.deltaY * lines * 0.0015), x, y);
		}

		function down(event: PointerEvent) {
			if (event.button !== 0) return;
			if (!fingers.size) moved = 0;
			fingers.set(event.pointerId, place(event));
		}

		function move(event: PointerEvent) {
			const before = fingers.get(event.pointerId);
			if (!before) return;
			const now = place(event);
			moved += Math.hypot(now.x - before.x, now.y - before.y);
			const other = [...fingers].find(([id]) => id !== event.pointerId)?.[1];
			if (other) pinch(before, now, other);
			else if (moved > clickSlack && (view.scale > 1 || event.pointerType === 'mouse')) {
				if (!frame.hasPointerCapture(event.pointerId)) frame.setPointerCapture(event.pointerId);
				view.pan(now.x - before.x, now.y - before.y);
			}
			fingers.set(event.pointerId, now);
		}

		function pinch(
			before: { x: number; y: number },
			now: { x: number; y: number },
			other: { x: number; y: number },
		) {
			const spread = (at: { x: number; y: number }) => Math.hypot(at.x - other.x, at.y - other.y);
			view.pan((now.x - before.x) / 2, (now.y - before.y) / 2);
			view.zoom(spread(now) / (spread(before) || 1), (now.x + other.x) / 2, (now.y + other.y) / 2);
		}

		function up(event: PointerEvent) {
			if (!fingers.delete(event.pointerId) || fingers.size) return;
			if (event.type !== 'pointerup' || moved > clickSlack) return;
			const { x, y } = place(event);
			onpress(event.target, [x, y]);
		}

		frame.addEventListener('wheel', wheel, { passive: false });
		frame.addEventListener('pointerdown', down);
		frame.addEventListener('pointermove', move);
		frame.addEventListener('pointerup', up);
		frame.addEventListener('pointercancel', up);
		return () => {
			frame.removeEventListener('wheel', wheel);
			frame.removeEventListener('pointerdown', down);
			frame.removeEventListener('pointermove', move);
			frame.removeEventListener('pointerup', up);
			frame.removeEventListener('pointercancel', up);
		};
	};
