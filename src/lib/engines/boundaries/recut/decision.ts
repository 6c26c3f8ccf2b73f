import type { RegionMatch } from './region-match.ts';

/** What a person says about one region, by its key. */
export type Decision =
	/** the old region goes on as these new ones, whatever the areas say */
	| { kind: 'continues'; old: string; as: string[] }
	/** no new region stands for the old one */
	| { kind: 'gone'; old: string }
	/** the new region stands for no old one */
	| { kind: 'new'; region: string };

export type DecideResult =
	| { status: 'decided'; match: RegionMatch }
	/** why not, each a sentence; nothing was taken over */
	| { status: 'refused'; reasons: string[] };
