import * as chromatic from 'd3-scale-chromatic';
import { hexOf, hexOfOklab, readHex, type Triple } from '../colour/index.ts';

/** Colours for amounts: from low to high on one side, or to both sides of a middle. */
export interface Ramp {
	/** stable and url-safe */
	id: string;
	name: string;
	kind: 'sequential' | 'diverging';
	/** `#rrggbb` at 0 to 1; a diverging ramp is lightest at 0.5 */
	at: (share: number) => string;
	source: string;
	licence: string;
}

const viridis = {
	source: 'Smith and van der Walt 2015, matplotlib; in the npm package d3-scale-chromatic 3.1.1',
	licence: 'CC0-1.0',
};
const cividis = {
	source:
		'Nuñez, Anderton and Renslow 2018, PLoS ONE 13(7) e0199239; in the npm package d3-scale-chromatic 3.1.1',
	licence: 'CC0-1.0',
};
const brewer = {
	source:
		'Brewer, Harrower and the Pennsylvania State University, interpolated by the npm package d3-scale-chromatic 3.1.1',
	licence: 'Apache-2.0',
};
const house = { source: 'Merestone', licence: 'CC0-1.0' };

type Origin = Pick<Ramp, 'source' | 'licence'>;

const taken =
	(kind: Ramp['kind'], origin: Origin) =>
	(id: string, name: string, css: (share: number) => string): Ramp => ({
		...{ id, name, kind, ...origin },
		at: (share) => hexOfCss(css(share)),
	});

/** The package answers in hex digits or as `rgb(1, 2, 3)`. */
function hexOfCss(css: string): string {
	const hex = readHex(css);
	if (hex) return hex;
	const [red = 0, green = 0, blue = 0] = css.match(/[\d.]+/g)?.map(Number) ?? [];
	return hexOf([red / 255, green / 255, blue / 255]);
}

/** OKLab lightness, chroma and hue in degrees, in straight lines from one to the next. */
type Stop = readonly [lightness: number, chroma: number, hue: number];

const own = (kind: Ramp['kind'], id: string, name: string, stops: readonly Stop[]): Ramp => ({
	...{ id, name, kind, ...house },
	at: (share) => hexOfOklab(between(stops.map(placeOf), Math.min(1, Math.max(0, share)))),
});

const placeOf = ([lightness, chroma, hue]: Stop): Triple => {
	const angle = (hue * Math.PI) / 180;
	return [lightness, chroma * Math.cos(angle), chroma * Math.sin(angle)];
};

function between(places: readonly Triple[], share: number): Triple {
	const along = share * (places.length - 1);
	const from = Math.min(places.length - 2, Math.floor(along));
	const mix = (axis: 0 | 1 | 2) =>
		places[from][axis] + (along - from) * (places[from + 1][axis] - places[from][axis]);
	return [mix(0), mix(1), mix(2)];
}

const single = taken('sequential', brewer);
const both = taken('diverging', brewer);

/** Every ramp that is offered, those that serve most readers first. */
export const ramps: readonly Ramp[] = [
	own('sequential', 'house-dusk', 'House dusk', [
		[0.92, 0.075, 95],
		[0.74, 0.1, 45],
		[0.54, 0.12, 5],
		[0.3, 0.1, 300],
	]),
	own('sequential', 'house-slate', 'House slate', [
		[0.91, 0.03, 230],
		[0.65, 0.08, 245],
		[0.28, 0.06, 260],
	]),
	taken('sequential', viridis)('viridis', 'Viridis', chromatic.interpolateViridis),
	taken('sequential', cividis)('cividis', 'Cividis', chromatic.interpolateCividis),
	single('blues', 'Blues', chromatic.interpolateBlues),
	single('greens', 'Greens', chromatic.interpolateGreens),
	single('purples', 'Purples', chromatic.interpolatePurples),
	single('oranges', 'Oranges', chromatic.interpolateOranges),
	single('greys', 'Greys', chromatic.interpolateGreys),
	single('ylgnbu', 'Yellow, green, blue', chromatic.interpolateYlGnBu),
	single('ylorbr', 'Yellow, orange, brown', chromatic.interpolateYlOrBr),
	own('diverging', 'house-ochre-slate', 'House ochre and slate', [
		[0.34, 0.09, 55],
		[0.7, 0.11, 70],
		[0.93, 0.012, 95],
		[0.68, 0.1, 250],
		[0.32, 0.1, 265],
	]),
	both('puor', 'Purple and orange', (share) => chromatic.interpolatePuOr(1 - share)),
	both('brbg', 'Brown and blue-green', chromatic.interpolateBrBG),
	both('prgn', 'Purple and green', chromatic.interpolatePRGn),
	both('rdbu', 'Red and blue', (share) => chromatic.interpolateRdBu(1 - share)),
];

export const rampOf = (id: string): Ramp | undefined => ramps.find((ramp) => ramp.id === id);
