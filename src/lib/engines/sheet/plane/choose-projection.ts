/**
 * Which projection the map is drawn on. In: the extent and the layout's choice. Out: a projection on the
 * unit sphere, the sentence that names it on the sheet, and why it was taken. Unless the user asks for
 * another it is equal-area, because the sheet fills areas with colour.
 *
 * Source: Snyder 1987, USGS PP 1395, pp. 33-35: the world needs a projection of its own; a hemisphere
 * and shapes about as wide as high an azimuthal; an east-west shape a conic away from the equator and
 * a cylindrical along it; a north-south shape a transverse cylindrical. Parallels a sixth in from each
 * limit: p. 99.
 */
import type { SheetLayout } from '../layout.ts';
import type { FrameLayout } from '../layout/frame.ts';
import type { ProjectionKind } from '../layout/projection-kinds.ts';
import { degreeStep, roundTo } from './degrees.ts';
import { wrapLon, type Extent } from './extent.ts';
import * as other from './other-projections.ts';
import { refusalOf, type ProjectionFigures } from './projection-limits.ts';
import * as equal from './projections.ts';

export interface ProjectionChoice extends equal.ChosenProjection {
	kind: ProjectionKind;
	/** why this one, in a sentence */
	why: string;
	/** why what the user asked for cannot be had; the projection is then the one that suits */
	refused: string | null;
	figures: ProjectionFigures;
}

/** Wider than high by so much calls for a conic or cylindrical; higher than wide for a transverse. */
const wide = 1.25;
const tall = 0.5;

const reasons = {
	world:
		'Chosen because the regions go round the globe: Equal Earth shows all of it with true areas.',
	pole: 'Chosen because the regions lie round a pole: seen from above it, none is cut.',
	round:
		'Chosen because the regions reach about as far north and south as east and west: distances from the middle are kept alike on all sides.',
	tall: 'Chosen because the regions reach much further north and south than east and west: it is true along their middle meridian.',
	equator:
		'Chosen because the regions stretch east and west along the equator: it is true along two parallels there.',
	belt: 'Chosen because the regions stretch east and west away from the equator: it is true along two parallels among them.',
};

function suits({ west, east, south, north }: Extent): [ProjectionKind, string] {
	const [span, height, middle] = [east - west, north - south, (south + north) / 2];
	const poleInside = north > 85 || south < -85;
	if (span > 180 && poleInside && height < 90) return ['lambert-azimuthal', reasons.pole];
	if (span > 180 || (height > 100 && span > 170)) return ['equal-earth', reasons.world];
	if (height > 100 && span > 100) return ['lambert-azimuthal', reasons.round];
	const ratio = (span * Math.cos((middle * Math.PI) / 180)) / height;
	if (ratio < tall) return ['transverse-equal-area', reasons.tall];
	if (ratio < wide) return ['lambert-azimuthal', reasons.round];
	const alongEquator = Math.abs(middle) < Math.max(8, height / 4);
	return alongEquator ? ['cylindrical-equal-area', reasons.equator] : ['albers', reasons.belt];
}

/** Centre of an azimuthal: the pole when the regions go round it. */
function azimuthalCentre({ west, east, south, north }: Extent, step: number): [number, number] {
	if (east - west > 180 && north > 60 && south > -60) return [0, 90];
	if (east - west > 180 && south < -60 && north < 60) return [0, -90];
	return [wrapLon(roundTo((west + east) / 2, step)), roundTo((south + north) / 2, step)];
}

/** The standard parallels, kept off the poles and apart from being opposite to one another. */
function parallels({ south, north }: Extent): [number, number] {
	const [step, sixth] = [degreeStep(north - south), (north - south) / 6];
	return [roundTo(south + sixth, step), roundTo(north - sixth, step)];
}

/** The figures that suit an extent, of a kind. */
function figuresFor(kind: ProjectionKind, extent: Extent): ProjectionFigures {
	const { west, east, south, north } = extent;
	const step = degreeStep(Math.max(east - west, north - south));
	const world = east - west >= 300;
	// a map of the world must open exactly at the cut, so its centre is not rounded
	const lon = world ? wrapLon(extent.cut + 180) : wrapLon(roundTo((west + east) / 2, step));
	const azimuthal = kind === 'lambert-azimuthal' || kind === 'equidistant-azimuthal';
	const centre: [number, number] = azimuthal ? azimuthalCentre(extent, step) : [lon, 0];
	if (kind !== 'cylindrical-equal-area') return { kind, parallels: parallels(extent), centre };
	const furthest = Math.max(Math.abs(south), Math.abs(north));
	const parallel = Math.min(60, roundTo((furthest * 2) / 3, degreeStep(furthest)));
	return { kind, parallels: [parallel, -parallel], centre };
}

function made({ kind, parallels: [south, north], centre: [lon, lat] }: ProjectionFigures) {
	if (kind === 'albers') return equal.albers(south, north, lon);
	if (kind === 'lambert-azimuthal') return equal.lambertAzimuthal(lat, lon);
	if (kind === 'transverse-equal-area') return equal.transverseCylindrical(lon);
	if (kind === 'equal-earth') return equal.equalEarth(lon);
	if (kind === 'cylindrical-equal-area') return equal.cylindrical(Math.abs(south), lon);
	if (kind === 'lambert-conformal') return other.lambertConformal(south, north, lon);
	if (kind === 'equidistant-conic') return other.equidistantConic(south, north, lon);
	if (kind === 'equidistant-azimuthal') return other.equidistantAzimuthal(lat, lon);
	return kind === 'mercator' ? other.mercator(lon) : other.transverseMercator(lon);
}

/**
 * The projection for these regions on this layout.
 *
 * In: the extent from `extentOf`; `layout.projection`, where anything but `auto` is followed as the
 * user's own choice, with the parallels and the centre of `layout.frame`. Out: see `ProjectionChoice`;
 * figures in the sentence are the figures used. What cannot be drawn is refused in words, and the
 * projection that suits is taken.
 */
export function chooseProjection(
	extent: Extent,
	layout: Pick<SheetLayout, 'projection'> & { frame?: Pick<FrameLayout, 'parallels' | 'centre'> },
): ProjectionChoice {
	const [suited, why] = suits(extent);
	const suiting = figuresFor(suited, extent);
	const automatic = { ...made(suiting), kind: suited, why, refused: null, figures: suiting };
	if (layout.projection === 'auto') return automatic;
	const plain = figuresFor(layout.projection, extent);
	const [south, north] = layout.frame?.parallels ?? plain.parallels;
	const figures = {
		...plain,
		parallels: (south <= north ? [south, north] : [north, south]) as [number, number],
		centre: layout.frame?.centre ?? plain.centre,
	};
	const refused = refusalOf(figures, extent);
	if (refused)
		return {
			...automatic,
			refused: `${refused} ${automatic.sentence.split(',')[0]} is drawn instead.`,
		};
	const words =
		layout.projection === suited ? `Your choice, and the one that suits. ${why}` : 'Your choice.';
	return { ...made(figures), kind: layout.projection, why: words, refused: null, figures };
}
