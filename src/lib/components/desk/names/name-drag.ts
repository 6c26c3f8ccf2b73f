import type { NameHand } from '$lib/state/name-hand.svelte';
import type { Viewport } from '$lib/state/viewport.svelte';

/** a press that moves less than this many pixels moves no name */
const clickSlack = 4;

export interface NameDragHost {
	hand: NameHand;
	view: Viewport;
	/** width of the paper, mm; 0 while nothing is drawn */
	widthMm: () => number;
	/** a press on a name that did not move */
	onpress: (region: number) => void;
}

/** Names dragged with the pointer on the sheet's frame, instead of moving the sheet; fingers scroll as ever. */
export const nameDrag = (host: NameDragHost) => (frame: HTMLElement) => {
	const { hand, view } = host;
	let began: { region: number; x: number; y: number; moved: boolean } | null = null;

	/** hundredths of a millimetre to a pixel */
	const fine = () => (host.widthMm() * 100) / (view.paperWidth * view.scale || 1);
	function nameAt({ clientX, clientY, target }: PointerEvent): number {
		if (!hand.may || !host.widthMm()) return -1;
		if (target instanceof Element && target.closest('button, a, input, select')) return -1;
		const box = frame.getBoundingClientRect();
		const unit = fine();
		return hand.at((clientX - box.left - view.x) * unit, (clientY - box.top - view.y) * unit);
	}

	function down(event: PointerEvent) {
		if (event.button !== 0 || event.pointerType === 'touch') return;
		const region = nameAt(event);
		if (region < 0) return;
		event.stopImmediatePropagation();
		began = { region, x: event.clientX, y: event.clientY, moved: false };
	}

	function move(event: PointerEvent) {
		if (!began) {
			if (!event.buttons) frame.style.cursor = nameAt(event) >= 0 ? 'move' : '';
			return;
		}
		event.stopImmediatePropagation();
		const [dx, dy] = [event.clientX - began.x, event.clientY - began.y];
		if (!began.moved && Math.hypot(dx, dy) < clickSlack) return;
		if (!began.moved) frame.setPointerCapture(event.pointerId);
		began.moved = true;
		hand.dragged = { region: began.region, dx: dx * fine(), dy: dy * fine() };
	}

	function up(event: PointerEvent) {
		if (!began) return;
		event.stopImmediatePropagation();
		const { region, moved } = began;
		const { dragged } = hand;
		began = hand.dragged = null;
		if (event.type !== 'pointerup') return;
		if (moved && dragged) hand.move(region, dragged.dx / 100, dragged.dy / 100);
		host.onpress(region);
	}

	const first = { capture: true };
	const listeners = { pointerdown: down, pointermove: move, pointerup: up, pointercancel: up };
	for (const [name, listener] of Object.entries(listeners))
		frame.addEventListener(name, listener as EventListener, first);
	return () => {
		for (const [name, listener] of Object.entries(listeners))
			frame.removeEventListener(name, listener as EventListener, first);
	};
};
