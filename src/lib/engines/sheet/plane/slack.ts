import type { Extent } from './extent.ts';

/** A line may be off by this share of the map's extent before points are added to it. */
const slackShare = 1 / 20_000;

/** How far a line may be off at its middle on a map of an extent, in radii of the sphere. */
export const slackOf = ({ west, east, south, north }: Extent): number =>
	Math.min(Math.max(north - south, east - west) * (Math.PI / 180), 2) * slackShare;
