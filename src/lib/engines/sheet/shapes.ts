/** Drawn things that are neither a region's fill nor a border: hatches, water, graticule, frames. */
export interface DrawnShape {
	layer: ShapeLayer;
	/** x, y interleaved, of one path after the other */
	points: Int32Array;
	/** first point of every path, and the end: paths + 1 */
	starts: Uint32Array;
	/** whether every path is closed; filled by the even-odd rule */
	closed: boolean;
	fill: string | null;
	stroke: string | null;
	strokeWidth: number;
	/** line and gap in turn */
	dash?: number[];
	/** the fill as it was set, if the reader's eyes change it; `fill` is what that reader sees */
	set?: string;
	/** the ink that the shape belongs to, so that it can be set anew when inks change */
	ink?: number;
}

/** In this order from the bottom up; `shapeLayersUnder` lie below the fills, the first of `Over` above them. */
export const shapeLayersUnder = ['sea'] as const;
/** above the fills and below border lines */
export const shapeLayersOver = ['lakes', 'hatch', 'graticule', 'water'] as const;
/** above border lines and below names */
export const shapeLayersTop = [
	'inset',
	'legend-ground',
	'neat-line',
	'ground',
	'north',
	'legend',
] as const;

export type ShapeLayer =
	| (typeof shapeLayersUnder)[number]
	| (typeof shapeLayersOver)[number]
	| (typeof shapeLayersTop)[number];

/** All of them from the bottom up. */
export const shapeLayers: readonly ShapeLayer[] = [
	...shapeLayersUnder,
	...shapeLayersOver,
	...shapeLayersTop,
];

/** The shapes of one layer, in the order in which they are painted. */
export const shapesIn = ({ shapes }: { shapes: DrawnShape[] }, layer: ShapeLayer): DrawnShape[] =>
	shapes.filter((shape) => shape.layer === layer);
