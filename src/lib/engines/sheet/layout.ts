import { plainCollar, type CollarLook } from './layout/collar.ts';
import { plainFrame, type FrameLayout } from './layout/frame.ts';
import type { ProjectionKind } from './layout/projection-kinds.ts';
import { plainLettering, type Lettering } from './layout/lettering.ts';
import { plainLines, type LineLook } from './layout/lines.ts';

export type { CollarLook, TextBlock } from './layout/collar.ts';
export type { LineLook, RankLook } from './layout/lines.ts';

export const papers = ['A5', 'A4', 'A3', 'A2', 'A1', 'A0'] as const;

/** How the sheet is laid out; everything the reader sees beside fills and borders. Lengths in mm. */
export interface SheetLayout {
	title: string;
	subtitle: string;
	paper: (typeof papers)[number] | { widthMm: number; heightMm: number };
	orientation: 'landscape' | 'portrait';
	marginMm: number;
	/** 'auto' follows Snyder's guidance for the extent of the regions */
	projection: 'auto' | ProjectionKind;
	labels: boolean;
	/** column of the attribute table that names the level above (a province), or null */
	groupColumn: string | null;
	legend: boolean;
	scaleBar: boolean;
	credits: string;
	frame: FrameLayout;
	lettering: Lettering;
	lines: LineLook;
	collar: CollarLook;
}

type Unasked = 'frame' | 'lettering' | 'lines' | 'collar';

/** A stored layout as one of today: what it does not say yet is as it was before it could be said. */
export const wholeLayout = (
	stored: Omit<SheetLayout, Unasked> & { [Part in Unasked]?: Partial<SheetLayout[Part]> },
): SheetLayout => ({
	...stored,
	frame: { ...plainFrame, ...stored.frame },
	lettering: { ...plainLettering, ...stored.lettering },
	lines: { ...plainLines, ...stored.lines },
	collar: { ...plainCollar, ...stored.collar },
});

/** The line every sheet carries; it can be added to, never removed. */
export const caution =
	'Boundaries as supplied; not for navigation or for settling title. Disputed lines follow the supplier; defer to the competent authority and licensed surveyors.';
