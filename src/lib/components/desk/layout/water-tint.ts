import { inkDistances } from '$lib/engines/palettes/ink-distances';
import type { Ink } from '$lib/engines/palettes/palette';

/** Light and cool, so that they step back behind the inks. */
const tints = ['#dfe9ee', '#c9dde8', '#d3e6f0', '#b4d2e2', '#e9f1f4', '#a5c8dc'];

/** CIEDE2000 below which a reader may take a region for water: that of touching fills of some size. */
const toldApart = 10;

/** How near a tint comes to each ink, for whoever tells them apart least. */
const distances = (tint: string, inks: readonly Ink[]): number[] =>
	inkDistances([tint, ...inks.map(({ hex }) => hex)])[0].slice(1);

/** The tint that is told from all inks best. */
export function waterTint(inks: readonly Ink[]): string {
	const worst = (tint: string) => Math.min(Infinity, ...distances(tint, inks));
	return tints.reduce((best, tint) => (worst(tint) > worst(best) ? tint : best));
}

/** Names of the inks that a tint may be taken for. */
export const takenFor = (tint: string, inks: readonly Ink[]): string[] =>
	distances(tint, inks).flatMap((distance, ink) => (distance < toldApart ? [inks[ink].name] : []));
