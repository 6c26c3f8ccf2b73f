import type { Triple } from './hex.ts';

const degree = Math.PI / 180;
const pow7 = 25 ** 7;

/**
 * CIEDE2000 colour difference of two CIELAB colours (both D65 in this product), kL = kC = kH = 1.
 * Symmetric, 0 for equal colours; about 1 is just noticeable on large patches side by side.
 * Source: Sharma, Wu, Dalal 2005, Color Research & Application 30(1) 21-30; names as there.
 */
export function ciede2000([l1, a1, b1]: Triple, [l2, a2, b2]: Triple): number {
	const g = chromaGain((Math.hypot(a1, b1) + Math.hypot(a2, b2)) / 2);
	const [ap1, ap2] = [a1 * (1 + g), a2 * (1 + g)];
	const [cp1, cp2] = [Math.hypot(ap1, b1), Math.hypot(ap2, b2)];
	const [hp1, hp2] = [hue(ap1, b1), hue(ap2, b2)];
	const grey = cp1 * cp2 === 0;

	const dL = l2 - l1;
	const dC = cp2 - cp1;
	const dH = grey ? 0 : 2 * Math.sqrt(cp1 * cp2) * Math.sin((turn(hp1, hp2) / 2) * degree);

	const l50 = ((l1 + l2) / 2 - 50) ** 2;
	const c = (cp1 + cp2) / 2;
	const h = grey ? hp1 + hp2 : meanHue(hp1, hp2);
	const sL = 1 + (0.015 * l50) / Math.sqrt(20 + l50);
	const sC = 1 + 0.045 * c;
	const sH = 1 + 0.015 * c * hueWeight(h);
	const rT = -Math.sin(60 * Math.exp(-(((h - 275) / 25) ** 2)) * degree) * 2 * roughness(c);

	const [x, y, z] = [dL / sL, dC / sC, dH / sH];
	return Math.sqrt(x * x + y * y + z * z + rT * y * z);
}

function roughness(chroma: number): number {
	const c7 = chroma ** 7;
	return Math.sqrt(c7 / (c7 + pow7));
}

function chromaGain(chroma: number): number {
	return 0.5 * (1 - roughness(chroma));
}

function hue(a: number, b: number): number {
	const angle = Math.atan2(b, a) / degree;
	return angle < 0 ? angle + 360 : angle;
}

/** From one hue to the other the short way, -180 to 180. */
function turn(from: number, to: number): number {
	const difference = to - from;
	if (difference > 180) return difference - 360;
	return difference < -180 ? difference + 360 : difference;
}

function meanHue(h1: number, h2: number): number {
	const sum = h1 + h2;
	if (Math.abs(h1 - h2) <= 180) return sum / 2;
	return sum < 360 ? (sum + 360) / 2 : (sum - 360) / 2;
}

function hueWeight(h: number): number {
	return (
		1 -
		0.17 * Math.cos((h - 30) * degree) +
		0.24 * Math.cos(2 * h * degree) +
		0.32 * Math.cos((3 * h + 6) * degree) -
		0.2 * Math.cos((4 * h - 63) * degree)
	);
}
