import type { Desk } from '$lib/state/desk.svelte';
import { regionWords } from '$lib/state/region-words';
import { neighboursOf } from '$lib/state/region-links';
import type { Viewport } from '$lib/state/viewport.svelte';
import { nearestRegion, step, type Direction } from '$lib/state/walk';
import { counted } from '../format';
import type { Surface } from './surface';

const arrows: Record<string, Direction> = {
	ArrowLeft: 'left',
	ArrowRight: 'right',
	ArrowUp: 'up',
	ArrowDown: 'down',
};

/** Buttons and links over the sheet answer to Enter themselves. */
const isControl = (target: EventTarget | null) =>
	target instanceof Element && target.closest('button, a') !== null;

/** The sheet by keyboard: arrows walk from region to region, and what is reached is read out. */
export class SheetWalk {
	/** for the live region: what the last key came to */
	spoken = $state('');
	readonly #desk: Desk;
	readonly #surface: () => Surface | null;
	readonly #others: Record<string, () => void>;

	constructor(desk: Desk, view: Viewport, surface: () => Surface | null) {
		this.#desk = desk;
		this.#surface = surface;
		this.#others = {
			'+': () => view.zoom(1.5),
			'=': () => view.zoom(1.5),
			'-': () => view.zoom(1 / 1.5),
			'0': () => view.fit(),
			Enter: () => this.#open(),
			Escape: () => this.#clear(),
			' ': () => this.#toggle(),
		};
	}

	keydown = (event: KeyboardEvent) => {
		if (event.ctrlKey || event.metaKey || event.altKey) return;
		if ((event.key === 'Enter' || event.key === ' ') && isControl(event.target)) return;
		const direction = arrows[event.key];
		if (!direction && !this.#others[event.key]) return;
		event.preventDefault();
		if (direction) this.#walk(direction);
		else this.#others[event.key]();
	};

	#walk(direction: Direction) {
		const { drawn, selected } = this.#desk;
		if (!drawn) return;
		const { anchors, drawing } = drawn;
		const to =
			selected === null
				? nearestRegion(anchors, drawing.widthMm * 50, drawing.heightMm * 50)
				: step(selected, direction, anchors, this.#beside(selected));
		if (to < 0) {
			this.spoken = 'No region farther that way.';
			return;
		}
		this.#desk.select(to);
		this.#surface()?.setStop(to, true);
		this.spoken = this.#told(to);
	}

	#beside(region: number): number[] {
		const { sheet, links } = this.#desk;
		return neighboursOf(region, sheet.borders, links).map((one) => one.region);
	}

	#told(region: number): string {
		const desk = this.#desk;
		const plan = desk.planning;
		const ink = desk.shownInks[desk.paints[region]]?.name ?? 'no ink';
		const itself = plan ? regionWords(plan, region) : `${desk.nameOf(region)}, ${ink}`;
		const beside = this.#beside(region);
		const names = beside.slice(0, 8).map((other) => desk.nameOf(other));
		const listed = names.length ? `: ${names.join(', ')}` : '';
		return `${itself}, ${counted(beside.length, 'neighbour')}${listed}`;
	}

	#open() {
		const { selected } = this.#desk;
		if (selected === null) return;
		const { planning: plan, rules } = this.#desk;
		if (rules.pairing) return rules.complete(selected);
		if (plan?.mayEdit && plan.hand.inHand !== null)
			return plan.hand.give([selected], plan.hand.inHand);
		this.#desk.panel = 'region';
		this.spoken = `${this.#desk.nameOf(selected)} is open beside the sheet.`;
	}

	#toggle() {
		const { selected, planning } = this.#desk;
		if (planning?.mayEdit && selected !== null) planning.hand.toggle(selected);
	}

	#clear() {
		// the bar over the sheet ends a pair that was begun
		if (this.#desk.rules.pairing) return;
		this.#desk.planning?.hand.clear();
		this.#desk.evidence = null;
		this.#desk.select(null);
		this.#surface()?.setStop(null, true);
		this.spoken = 'Nothing selected.';
	}
}
