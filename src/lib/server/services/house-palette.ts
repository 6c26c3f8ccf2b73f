import { housePalettes, type Palette } from '../../engines/palettes/index.ts';

/** The shortest house palette with at least so many inks; the longest when none is long enough. */
export const paletteFor = (inks: number): Palette =>
	housePalettes.find((palette) => palette.inks.length >= inks) ?? (housePalettes.at(-1) as Palette);
