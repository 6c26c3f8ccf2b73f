import { readHex, type Triple } from '../../colour/hex.ts';
import { fromLinear, hexOfLinear, linearOf } from '../../colour/srgb.ts';
import { isObject, type Json, type JsonObject } from './document.ts';
import { inGamut, intoGamut } from './gamut.ts';
import type { Groups } from './groups.ts';
import { tokenSpaces } from './spaces.ts';
import { follow } from './values.ts';

/** A colour token's value as an ink, with what must be told about how it was read; or why it is none. */
export type ColourRead = { hex: string; told: string[] } | { unfit: string };

/**
 * The value of a colour token (Design Tokens Color Module 2025.10: colorSpace, components, alpha, hex) as
 * an opaque sRGB ink.
 *
 * Told: another space than sRGB, converted; a colour sRGB cannot show; a `hex` that says another colour than
 * the components, which are followed; opacity, which an ink has not; the older form, a bare hex text.
 */
export function readColour(groups: Groups, value: Json): ColourRead {
	if (typeof value === 'string') return olderForm(value);
	if (!isObject(value)) return { unfit: 'its value is no colour' };
	const space = resolved(groups, value.get('colorSpace'));
	if (typeof space !== 'string') return { unfit: 'it names no colour space' };
	const toLinear = Object.hasOwn(tokenSpaces, space) ? tokenSpaces[space] : undefined;
	if (!toLinear)
		return { unfit: `its colour space “${space.slice(0, 40)}” is not one of the report’s` };
	const components = componentsOf(groups, value);
	if (!components) return { unfit: 'its components are not three numbers' };
	const alpha = resolved(groups, value.get('alpha')) ?? 1;
	if (typeof alpha !== 'number' || !(alpha >= 0 && alpha <= 1))
		return { unfit: 'its opacity is not between 0 and 1' };
	if (alpha === 0) return { unfit: 'it is fully transparent' };
	const linear = toLinear(components);
	if (!linear.every(Number.isFinite)) return { unfit: 'its components are out of all bounds' };
	const hex = hexOfLinear(intoGamut(linear));
	return {
		hex,
		told: [
			...spaceTold(space, linear, hex),
			...hexTold(groups, value, hex),
			...alphaTold(alpha, hex),
		],
	};
}

function olderForm(text: string): ColourRead {
	const hex = /^#/.test(text.trim()) ? readHex(text) : null;
	if (!hex) return { unfit: `its value “${text.slice(0, 40)}” is no colour` };
	return {
		hex,
		told: [`is a bare ${hex}, as earlier drafts of the format wrote colours; read as sRGB`],
	};
}

function spaceTold(space: string, linear: Triple, hex: string): string[] {
	if (inGamut(linear)) return space === 'srgb' ? [] : [`is converted from ${space} to ${hex}`];
	return [
		`is a colour of ${space} that sRGB cannot show; ${hex} has its lightness and hue, and as much of its chroma as fits`,
	];
}

function hexTold(groups: Groups, value: JsonObject, hex: string): string[] {
	const said = resolved(groups, value.get('hex'));
	if (said === undefined || said === null) return [];
	const other = typeof said === 'string' ? readHex(said) : null;
	if (!other) return ['has a hex that is no colour; its components were read'];
	if (steps(other, hex) <= 1) return [];
	return [
		`can be read two ways: its components come to ${hex}, its hex says ${other}; the components were read`,
	];
}

function alphaTold(alpha: number, hex: string): string[] {
	if (alpha === 1) return [];
	const [r, g, b] = linearOf(hex).map((channel) => alpha * fromLinear(channel) + 1 - alpha);
	const onWhite = `#${[r, g, b]
		.map((v) =>
			Math.round(v * 255)
				.toString(16)
				.padStart(2, '0'),
		)
		.join('')}`;
	return [
		`has an opacity of ${Math.round(alpha * 100)} %, and inks are opaque: read as ${hex}; on white paper it would look like ${onWhite}`,
	];
}

/** The largest difference of a channel, in steps of 8 bits. */
function steps(one: string, two: string): number {
	const bytes = (hex: string) => [1, 3, 5].map((at) => parseInt(hex.slice(at, at + 2), 16));
	const other = bytes(two);
	return Math.max(...bytes(one).map((byte, i) => Math.abs(byte - other[i])));
}

/** Three numbers, `none` as 0 (CSS Color Module Level 4, section 4.4), each perhaps a reference. */
function componentsOf(groups: Groups, value: JsonObject): Triple | null {
	const list = resolved(groups, value.get('components'));
	if (!Array.isArray(list) || list.length !== 3) return null;
	const [a, b, c] = (list as Json[]).map((one) => {
		const number = resolved(groups, one);
		return number === 'none' ? 0 : typeof number === 'number' ? number : NaN;
	});
	return [a, b, c].every(Number.isFinite) ? [a, b, c] : null;
}

const resolved = (groups: Groups, node: Json | undefined): Json | undefined =>
	node === undefined ? undefined : follow(groups, node)?.value;
