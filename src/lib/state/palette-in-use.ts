import type { Draft } from '$lib/engines/editions/draft';
import type { Palette } from '$lib/engines/palettes/palette';
import { sameInks } from '$lib/engines/palettes/same-inks';

export interface PaletteInUse {
	/** the one offered that the sheet is printed from, ink by ink */
	known?: Palette;
	/** the one that the sheet took, where it has other inks by now than the sheet */
	moved?: Palette;
	/** what the sheet's own inks were made from */
	made?: Palette;
}

/** Which of the palettes that are offered the sheet's inks are. A sheet keeps the copy that it took. */
export function paletteInUse(now: Draft['palette'], offered: readonly Palette[]): PaletteInUse {
	const taken = offered.find(({ id }) => id === now.id);
	if (taken) return sameInks(taken.inks, now.inks) ? { known: taken } : { moved: taken };
	const made = offered.find(({ id }) => id === now.from);
	return made ? { made } : {};
}
