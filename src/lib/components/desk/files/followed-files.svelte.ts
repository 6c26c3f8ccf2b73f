import { invalidate } from '$app/navigation';
import { isOpenExport, type DeskExport } from '$lib/schemas/export';
import { followProposals } from '$lib/state/follow-proposals';

/** Files with how far they are, asked for again and again while any is open; to be made with a component. */
export class FollowedFiles {
	/** whether the last question went unanswered */
	lost = $state(false);
	#told: DeskExport[] = $state.raw([]);
	#known: () => DeskExport[];

	constructor(address: () => string, known: () => DeskExport[]) {
		this.#known = known;
		$effect(() => {
			this.lost = false;
			const open = known().filter(isOpenExport);
			if (!open.length) return;
			const numbers = open.map(({ number }) => number).join(',');
			return followProposals<DeskExport>(`${address()}/exports?of=${numbers}`, open, {
				told: (now) => now.length > 0 && (this.#told = now),
				ended: () => invalidate('merestone:exports'),
				reached: (yes) => (this.lost = !yes),
			});
		});
	}

	/** What was told of one on the way counts only until the page says that it has ended. */
	get all(): DeskExport[] {
		return this.#known().map((one) =>
			isOpenExport(one) ? (this.#told.find(({ number }) => number === one.number) ?? one) : one,
		);
	}
}
