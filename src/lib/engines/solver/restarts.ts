/** Luby, Sinclair and Zuckerman 1993: 1 1 2 1 1 2 4 ..., for `turn` from 0. */
export function luby(turn: number): number {
	let size = 1;
	let power = 0;
	while (size < turn + 1) {
		size = 2 * size + 1;
		power++;
	}
	while (size - 1 !== turn) {
		size = (size - 1) >> 1;
		power--;
		turn %= size;
	}
	return 2 ** power;
}

const LUBY_UNIT = 128;
const FIRST_SPELL = 1000;
const HASTY_GAP = 40;

/**
 * When to start over. Spells of two kinds take turns, each longer than the last: hasty ones restart
 * as soon as clauses learnt lately span more levels than usual (Audemard and Simon 2012, with running
 * means as in Biere and Froehlich 2015), which is good at refuting; calm ones follow Luby's sequence,
 * which is good at finding.
 */
export class Restarts {
	private lately = 0;
	private usual = 0;
	private conflicts = 0;
	private since = 0;
	private turn = 0;
	private limit = LUBY_UNIT;
	private hasty = true;
	private spell = FIRST_SPELL;
	private left = FIRST_SPELL;

	/** Notes a conflict whose clause has this glue; true when it is time to start over. */
	conflict(glue: number): boolean {
		this.since++;
		this.conflicts++;
		this.lately += (glue - this.lately) / Math.min(32, this.conflicts);
		this.usual += (glue - this.usual) / Math.min(4096, this.conflicts);
		if (--this.left === 0) this.changeSpell();
		const due = this.hasty
			? this.since >= HASTY_GAP && this.lately > 1.15 * this.usual
			: this.since >= this.limit;
		if (due) this.restarted();
		return due;
	}

	private changeSpell(): void {
		this.hasty = !this.hasty;
		this.spell = Math.ceil(this.spell * 1.2);
		this.left = this.spell;
	}

	private restarted(): void {
		this.since = 0;
		if (!this.hasty) this.limit = LUBY_UNIT * luby(++this.turn);
	}
}
