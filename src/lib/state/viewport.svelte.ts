/** What part of the sheet is in view: the paper, `scale` times its fitted size, moved by x and y pixels. */
export class Viewport {
	scale = $state(1);
	x = $state(0);
	y = $state(0);
	/** pixels of the frame, and of the fitted paper within it */
	width = $state(0);
	height = $state(0);
	paperWidth = $state(0);
	paperHeight = $state(0);

	static readonly most = 40;
	/** larger than this the sheet is shown only when somebody zooms */
	static readonly mostByItself = 10;

	/** Lays the paper (millimetres) into the frame with room for the crop marks around it. */
	frame(width: number, height: number, widthMm: number, heightMm: number) {
		const room = Math.min(40, width / 12);
		const fit = Math.min((width - 2 * room) / widthMm, (height - 2 * room) / heightMm);
		const wasFitted = this.scale === 1;
		const { centre } = this;
		this.width = width;
		this.height = height;
		this.paperWidth = Math.max(1, fit * widthMm);
		this.paperHeight = Math.max(1, fit * heightMm);
		if (wasFitted) this.fit();
		else this.stand(centre, this.scale);
	}

	/** What lies in the middle of the frame, as shares of the paper. */
	get centre(): Point {
		const across = this.paperWidth * this.scale || 1;
		const down = this.paperHeight * this.scale || 1;
		return { x: (this.width / 2 - this.x) / across, y: (this.height / 2 - this.y) / down };
	}

	/** Puts a point of the paper into the middle of the frame. */
	stand({ x, y }: Point, scale: number) {
		this.scale = scale;
		this.x = this.width / 2 - x * this.paperWidth * scale;
		this.y = this.height / 2 - y * this.paperHeight * scale;
		this.#hold();
	}

	fit() {
		this.scale = 1;
		this.x = (this.width - this.paperWidth) / 2;
		this.y = (this.height - this.paperHeight) / 2;
	}

	/** Zooms by a factor, the place under (px, py) of the frame staying where it is. */
	zoom(factor: number, px = this.width / 2, py = this.height / 2) {
		const scale = Math.min(Viewport.most, Math.max(1, this.scale * factor));
		if (scale < 1.001) return this.fit();
		const by = scale / this.scale;
		this.x = px - (px - this.x) * by;
		this.y = py - (py - this.y) * by;
		this.scale = scale;
		this.#hold();
	}

	pan(dx: number, dy: number) {
		this.x += dx;
		this.y += dy;
		this.#hold();
	}

	/** Brings a box (shares of the paper, 0 to 1) into view, moving no more than is needed. */
	reveal({ left, top, right, bottom }: Record<'left' | 'top' | 'right' | 'bottom', number>) {
		const margin = 24;
		const across = this.paperWidth * this.scale;
		const down = this.paperHeight * this.scale;
		this.pan(
			nudge(this.x + left * across, this.x + right * across, margin, this.width - margin),
			nudge(this.y + top * down, this.y + bottom * down, margin, this.height - margin),
		);
	}

	/** Fills the middle of the frame with a box (shares of the paper), what lies around it in sight. */
	show({ left, top, right, bottom }: Record<'left' | 'top' | 'right' | 'bottom', number>) {
		const across = Math.max((right - left) * this.paperWidth, 1);
		const down = Math.max((bottom - top) * this.paperHeight, 1);
		const scale = Math.min((shownShare * this.width) / across, (shownShare * this.height) / down);
		const middle = { x: (left + right) / 2, y: (top + bottom) / 2 };
		this.stand(middle, Math.min(Viewport.mostByItself, Math.max(1, scale)));
	}

	/** some of the paper always stays in view */
	#hold() {
		const across = this.paperWidth * this.scale;
		const down = this.paperHeight * this.scale;
		this.x = Math.min(this.width * 0.8, Math.max(this.width * 0.2 - across, this.x));
		this.y = Math.min(this.height * 0.8, Math.max(this.height * 0.2 - down, this.y));
		if (this.scale === 1) this.fit();
	}
}

type Point = Record<'x' | 'y', number>;

/** how much of the frame's width and height a box fills that is shown */
const shownShare = 0.6;

function nudge(from: number, to: number, least: number, most: number): number {
	if (to - from > most - least) return (least + most) / 2 - (from + to) / 2;
	if (from < least) return least - from;
	return to > most ? most - to : 0;
}
