import type { Colours, DrawnShape, Ground, LineLayer, Outline } from '$lib/engines/sheet';
import type { Spot } from './tile-grid';

/**
 * What the painter of tiles is told: the geometry, how it looks, and which tiles are wanted now. Geometry
 * and look count their versions together.
 */
export type TileOrder =
	| { kind: 'ground'; ground: Ground; lines: LineLayer[]; shapes: DrawnShape[]; version: number }
	| { kind: 'look'; colours: Colours; outline: Outline | null; version: number }
	| { kind: 'want'; spots: Spot[] };

/** A painted tile, under the version of geometry and look that it shows. */
export type TileReply = { spot: Spot; version: number; bitmap: ImageBitmap } | { failed: string };
