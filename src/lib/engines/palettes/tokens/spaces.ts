import type { Triple } from '../../colour/hex.ts';
import { linearOfOklab } from '../../colour/oklab.ts';
import { times, toLinear } from '../../colour/srgb.ts';

/**
 * The colour spaces of the Design Tokens Colour Module 2025.10, each brought to linear sRGB. Channels
 * outside 0 to 1 are colours that sRGB cannot show. Source of the matrices and curves: CSS Color Module
 * Level 4, sample code for colour conversions; D50 and D65 adapted by Bradford.
 */
export const tokenSpaces: Readonly<Record<string, (components: Triple) => Triple>> = {
	srgb: each(signed(toLinear)),
	'srgb-linear': (linear) => linear,
	hsl: (hsl) => each(signed(toLinear))(rgbOfHsl(hsl)),
	hwb: (hwb) => each(signed(toLinear))(rgbOfHwb(hwb)),
	lab: (lab) => fromD50(xyzOfLab(lab)),
	lch: (lch) => fromD50(xyzOfLab(unrolled(lch))),
	oklab: linearOfOklab,
	oklch: (lch) => linearOfOklab(unrolled(lch)),
	'display-p3': (rgb) => fromD65(times(p3, each(signed(toLinear))(rgb))),
	'a98-rgb': (rgb) => fromD65(times(a98, each(signed((v) => v ** (563 / 256)))(rgb))),
	'prophoto-rgb': (rgb) => fromD50(times(prophoto, each(signed(proPhotoLight))(rgb))),
	rec2020: (rgb) => fromD65(times(rec2020, each(signed(rec2020Light))(rgb))),
	'xyz-d65': (xyz) => fromD65(xyz),
	'xyz-d50': (xyz) => fromD50(xyz),
};

// prettier-ignore
const xyzToLinear = [
	12831 / 3959, -329 / 214, -1974 / 3959,
	-851781 / 878810, 1648619 / 878810, 36519 / 878810,
	705 / 12673, -2585 / 12673, 705 / 667,
];
// prettier-ignore
const d50ToD65 = [
	0.955473421488075, -0.02309845494876471, 0.06325924320057072,
	-0.0283697093338637, 1.0099953980813041, 0.021041441191917323,
	0.012314014864481998, -0.020507649298898964, 1.330365926242124,
];
// prettier-ignore
const p3 = [
	608311 / 1250200, 189793 / 714400, 198249 / 1000160,
	35783 / 156275, 247089 / 357200, 198249 / 2500400,
	0, 32229 / 714400, 5220557 / 5000800,
];
// prettier-ignore
const a98 = [
	573536 / 994567, 263643 / 1420810, 187206 / 994567,
	591459 / 1989134, 6239551 / 9945670, 374412 / 4972835,
	53769 / 1989134, 351524 / 4972835, 4929758 / 4972835,
];
// prettier-ignore
const prophoto = [
	0.7977666449006423, 0.13518129740053308, 0.0313477341283922,
	0.2880748288194013, 0.711835234241873, 0.00008993693872564,
	0, 0, 0.8251046025104602,
];
// prettier-ignore
const rec2020 = [
	63426534 / 99577255, 20160776 / 139408157, 47086771 / 278816314,
	26158966 / 99577255, 472592308 / 697040785, 8267143 / 139408157,
	0, 19567812 / 697040785, 295819943 / 278816314,
];

function fromD65(xyz: Triple): Triple {
	return times(xyzToLinear, xyz);
}

function fromD50(xyz: Triple): Triple {
	return fromD65(times(d50ToD65, xyz));
}

function each(curve: (value: number) => number): (triple: Triple) => Triple {
	return ([a, b, c]) => [curve(a), curve(b), curve(c)];
}

/** A curve continued below zero as its own mirror image, as colours outside a gamut need it. */
function signed(curve: (value: number) => number): (value: number) => number {
	return (value) => Math.sign(value) * curve(Math.abs(value));
}

const proPhotoLight = (value: number) => (value <= 16 / 512 ? value / 16 : value ** 1.8);

function rec2020Light(value: number): number {
	const [alpha, beta] = [1.09929682680944, 0.018053968510807];
	return value < beta * 4.5 ? value / 4.5 : ((value + alpha - 1) / alpha) ** (1 / 0.45);
}

function rgbOfHsl([hue, saturation, lightness]: Triple): Triple {
	const [s, l] = [saturation / 100, lightness / 100];
	const reach = s * Math.min(l, 1 - l);
	const channel = (n: number) => {
		const k = (n + (((hue % 360) + 360) % 360) / 30) % 12;
		return l - reach * Math.max(-1, Math.min(k - 3, 9 - k, 1));
	};
	return [channel(0), channel(8), channel(4)];
}

function rgbOfHwb([hue, whiteness, blackness]: Triple): Triple {
	const [white, black] = [whiteness / 100, blackness / 100];
	if (white + black >= 1) {
		const grey = white / (white + black);
		return [grey, grey, grey];
	}
	return each((value) => value * (1 - white - black) + white)(rgbOfHsl([hue, 100, 50]));
}

/** CIELAB with white D50, as CSS has it. */
function xyzOfLab([l, a, b]: Triple): Triple {
	const [kappa, epsilon] = [24389 / 27, 216 / 24389];
	const fy = (l + 16) / 116;
	const [fx, fz] = [a / 500 + fy, fy - b / 200];
	const back = (f: number) => (f ** 3 > epsilon ? f ** 3 : (116 * f - 16) / kappa);
	const y = l > kappa * epsilon ? fy ** 3 : l / kappa;
	return [back(fx) * (0.3457 / 0.3585), y, back(fz) * ((1 - 0.3457 - 0.3585) / 0.3585)];
}

function unrolled([l, chroma, hue]: Triple): Triple {
	const angle = (hue * Math.PI) / 180;
	return [l, chroma * Math.cos(angle), chroma * Math.sin(angle)];
}
