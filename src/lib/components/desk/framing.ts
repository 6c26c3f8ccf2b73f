import type { Area } from '$lib/engines/sheet';
import type { Evidence } from '$lib/state/evidence';
import type { Viewport } from '$lib/state/viewport.svelte';

type View = Pick<Viewport, 'centre' | 'scale' | 'show' | 'stand'>;
/** where the sheet stands, whatever the size of the frame */
type Stand = Pick<Viewport, 'centre' | 'scale'>;

/**
 * Brings into view what asks for it, once, and goes back to where the sheet stood before as soon as
 * nothing is pointed out any more, unless it was moved by hand meanwhile.
 */
export class Framing {
	#framed: Evidence | null = null;
	#before: Stand | null = null;
	#after: Stand | null = null;

	constructor(private readonly view: View) {}

	follow(evidence: Evidence | null, boxOf: (region: number) => Area | null) {
		if (!evidence) return this.#goBack();
		if (!evidence.framed || evidence === this.#framed) return;
		const box = boxOfAll([...evidence.strong, ...evidence.light], boxOf);
		if (!box) return;
		if (!this.#untouched()) this.#before = standOf(this.view);
		this.#framed = evidence;
		this.view.show(box);
		this.#after = standOf(this.view);
	}

	#goBack() {
		if (this.#before && this.#untouched()) this.view.stand(this.#before.centre, this.#before.scale);
		this.#framed = this.#before = this.#after = null;
	}

	#untouched(): boolean {
		const [now, then] = [this.view, this.#after];
		if (!then) return false;
		const moved = Math.hypot(now.centre.x - then.centre.x, now.centre.y - then.centre.y);
		return now.scale === then.scale && moved < 1e-6;
	}
}

const standOf = ({ centre, scale }: Stand): Stand => ({ centre, scale });

function boxOfAll(regions: readonly number[], boxOf: (region: number) => Area | null): Area | null {
	let all: Area | null = null;
	for (const region of regions) {
		const box = boxOf(region);
		if (!box) continue;
		all = all
			? {
					left: Math.min(all.left, box.left),
					top: Math.min(all.top, box.top),
					right: Math.max(all.right, box.right),
					bottom: Math.max(all.bottom, box.bottom),
				}
			: box;
	}
	return all;
}
