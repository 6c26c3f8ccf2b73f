/**
 * Which equal-area projection suits an extent. In: the extent and the layout's choice. Out: a
 * projection on the unit sphere and the sentence that names it on the sheet. Equal-area always,
 * because the sheet fills areas with colour.
 *
 * Source: Snyder 1987, USGS PP 1395, pp. 33-35: the world needs a projection of its own; a hemisphere
 * and shapes about as wide as high an azimuthal; an east-west shape a conic away from the equator and
 * a cylindrical along it; a north-south shape a transverse cylindrical. Parallels a sixth in from each
 * limit: p. 99.
 */
import type { SheetLayout } from '../layout.ts';
import { degreeStep, roundTo } from './degrees.ts';
import { wrapLon, type Extent } from './extent.ts';
import {
	albers,
	cylindrical,
	equalEarth,
	lambertAzimuthal,
	transverseCylindrical,
	type ChosenProjection,
} from './projections.ts';

type Chosen = Exclude<SheetLayout['projection'], 'auto'> | 'transverse';

/** Wider than high by so much calls for a conic or cylindrical; higher than wide for a transverse. */
const wide = 1.25;
const tall = 0.5;

function suits({ west, east, south, north }: Extent): Chosen {
	const [span, height, middle] = [east - west, north - south, (south + north) / 2];
	const poleInside = north > 85 || south < -85;
	if (span > 180) {
		return poleInside && height < 90 ? 'lambert-azimuthal' : 'equal-earth';
	}
	if (height > 100 && span > 100) return span > 170 ? 'equal-earth' : 'lambert-azimuthal';
	const ratio = (span * Math.cos((middle * Math.PI) / 180)) / height;
	if (ratio < tall) return 'transverse';
	if (ratio < wide) return 'lambert-azimuthal';
	const alongEquator = Math.abs(middle) < Math.max(8, height / 4);
	return alongEquator ? 'cylindrical-equal-area' : 'albers';
}

/** Centre of an azimuthal: the pole when the regions go round it. */
function azimuthalCentre({ west, east, south, north }: Extent, step: number): [number, number] {
	if (east - west > 180 && north > 60 && south > -60) return [90, 0];
	if (east - west > 180 && south < -60 && north < 60) return [-90, 0];
	return [roundTo((south + north) / 2, step), wrapLon(roundTo((west + east) / 2, step))];
}

/** The standard parallels, kept off the poles and apart from being opposite to one another. */
function parallels({ south, north }: Extent): [number, number] {
	const [step, sixth] = [degreeStep(north - south), (north - south) / 6];
	return [roundTo(south + sixth, step), roundTo(north - sixth, step)];
}

/**
 * The projection for these regions on this layout.
 *
 * In: the extent from `extentOf`; `layout.projection`, where anything but `auto` is followed as the
 * user's own choice. Out: see `ChosenProjection`; figures in the sentence are the figures used.
 */
export function chooseProjection(
	extent: Extent,
	layout: Pick<SheetLayout, 'projection'>,
): ChosenProjection {
	const choice = layout.projection === 'auto' ? suits(extent) : layout.projection;
	const { west, east, south, north } = extent;
	const step = degreeStep(Math.max(east - west, north - south));
	const world = east - west >= 300;
	// a map of the world must open exactly at the cut, so its centre is not rounded
	const centre = world ? wrapLon(extent.cut + 180) : wrapLon(roundTo((west + east) / 2, step));
	if (choice === 'albers') return albers(...parallels(extent), centre);
	if (choice === 'transverse') return transverseCylindrical(centre);
	if (choice === 'equal-earth') return equalEarth(centre);
	if (choice === 'lambert-azimuthal') return lambertAzimuthal(...azimuthalCentre(extent, step));
	const furthest = Math.max(Math.abs(south), Math.abs(north));
	const parallel = Math.min(60, roundTo((furthest * 2) / 3, degreeStep(furthest)));
	return cylindrical(parallel, centre);
}
