import type { Triple } from './hex.ts';
import { luminanceY } from './lab.ts';
import type { Reader } from './reader.ts';
import { clipped, hexOfLinear, linearOf, times } from './srgb.ts';

/**
 * Complete deficiency (severity 1.0) as matrices on linear sRGB.
 * Source: Machado, Oliveira, Fernandes 2009, IEEE TVCG 15(6) 1291-1298, doi 10.1109/TVCG.2009.113.
 */
const machado = {
	protan: [
		0.152286, 1.052583, -0.204868, 0.114503, 0.786281, 0.099216, -0.003882, -0.048116, 1.051998,
	],
	deutan: [
		0.367322, 0.860646, -0.227968, 0.280085, 0.672501, 0.047413, -0.01182, 0.04294, 0.968881,
	],
	tritan: [
		1.255528, -0.076749, -0.178779, -0.078411, 0.930809, 0.147602, 0.004733, 0.691367, 0.3039,
	],
} as const;

/**
 * Two half-planes of linear sRGB and the normal of the plane that parts them.
 * Source: Brettel, Vienot, Mollon 1997, JOSA A 14(10) 2647-2655; matrices as published for sRGB by
 * libDaltonLens (public domain).
 */
const brettelTritan = {
	above: [1.01277, 0.13548, -0.14826, -0.01243, 0.86812, 0.14431, 0.07589, 0.805, 0.11911],
	below: [0.93678, 0.18979, -0.12657, 0.06154, 0.81526, 0.1232, -0.37562, 1.12767, 0.24796],
	normal: [0.03901, -0.02788, -0.01113] as Triple,
};

/**
 * What a reader sees, in linear sRGB, clipped to 0 to 1.
 *
 * In: linear sRGB, 0 to 1. `grey` gives the neutral of the same luminance, hence of the same L*.
 * The matrices are applied to linear values: on gamma-encoded ones they err by up to 28 of 255.
 */
export function seenLinear(linear: Triple, reader: Reader): Triple {
	if (reader === 'typical') return linear;
	if (reader === 'grey') {
		const y = Math.min(1, luminanceY(linear));
		return [y, y, y];
	}
	return clipped(times(machado[reader], linear));
}

/** The colour in hex digits as a reader sees it, rounded to 8 bits. Throws on text that is no colour. */
export function asSeenBy(hex: string, reader: Reader): string {
	return hexOfLinear(seenLinear(linearOf(hex), reader));
}

/**
 * What a tritan reader sees by the older model of Brettel, in linear sRGB, clipped: a second opinion,
 * because models of this deficiency differ more than those of the others.
 */
export function tritanSecondOpinion(linear: Triple): Triple {
	const { above, below, normal } = brettelTritan;
	const side = normal[0] * linear[0] + normal[1] * linear[1] + normal[2] * linear[2];
	return clipped(times(side >= 0 ? above : below, linear));
}
