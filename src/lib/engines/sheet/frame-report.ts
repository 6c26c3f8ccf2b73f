import type { ProjectionKind } from './layout/projection-kinds.ts';
import type { ClusterPlace } from './insets/share-out.ts';

/** What the drawing tells of its frame, for the form that sets it. */
export interface FrameReport {
	projection: {
		kind: ProjectionKind;
		/** why this one */
		why: string;
		/** why the one asked for is not drawn */
		refused: string | null;
		equalArea: boolean;
		/** figures in use, degrees */
		parallels: [number, number];
		centre: [number, number];
	};
	/** 1 : n at the middle of the map; null where it cannot be measured */
	ratio: number | null;
	/** what could not be done as asked, in sentences */
	told: string[];
	/** groups of parts far from one another, the largest first; none while no insets are asked for */
	clusters: ClusterReport[];
	/** why there is no north arrow though it was asked for */
	noArrow: string | null;
	/** degrees from line to line */
	graticule: { lat: number; lon: number } | null;
	/** how many gaps are tinted as lakes */
	lakes: number;
}

export interface ClusterReport {
	/** name in `FrameLayout.insetChoices` */
	id: string;
	name: string;
	regions: number;
	areaKm2: number;
	place: ClusterPlace;
	suits: ClusterPlace;
	speck: boolean;
	/** of its box: 1 : n, and upper left corner in mm */
	ratio: number | null;
	cornerMm: [number, number] | null;
}
