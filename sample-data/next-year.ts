import type { Point } from './cells.ts';
import { geojsonText } from './geojson.ts';
import { joined, split } from './reshape.ts';
import type { District } from './survey.ts';

/**
 * The republic a year later, after a reform: which districts changed and how is in README.md. Everything
 * else is as it was, position for position.
 */
export function nextYear(districts: readonly District[]): string {
	const list = structuredClone([...districts]);
	const find = (code: string) => {
		const found = list.find((district) => district.code === code);
		if (!found) throw new Error(`No district ${code}`);
		return found;
	};
	const remove = (code: string) => list.splice(list.indexOf(find(code)), 1)[0];

	find('0205').name = 'Jarlœrn Bay';
	find('1010').name = 'New Prinithe';
	find('0408').code = '0420';

	// one in two, under two new codes
	const whole = remove('0512');
	const halves = split(whole.polygons[0][0], 0.5);
	halves.forEach((ring, half) =>
		list.push({
			...shared(whole, half === 0 ? 0.55 : 0.45),
			code: `051${7 + half}`,
			name: half === 0 ? 'Merrennes North' : 'Merrennes South',
			polygons: [[ring]],
		}),
	);

	// two in one, under the code of the larger
	const smaller = remove('0807');
	const larger = find('0803');
	larger.polygons = [[joined(larger.polygons[0][0], smaller.polygons[0][0])]];
	larger.population += smaller.population;
	larger.households += smaller.households;

	// a piece of one goes to the next
	const [giver, taker] = [find('0614'), find('0612')];
	const [kept, given] = pieceBeside(giver.polygons[0][0], taker.polygons[0][0]);
	giver.polygons = [[kept]];
	taker.polygons = [[joined(taker.polygons[0][0], given)]];

	remove('0318');
	list.push({
		...{ code: '0421', name: 'Nyhólm', province: find('0402').province },
		...{ population: 212, households: 94, polygons: [[islet([-40.9, 53.4])]] },
	});
	list.sort((a, b) => (a.code < b.code ? -1 : 1));
	return geojsonText(list, 'Districts of Tavaröe, a year later');
}

const shared = (district: District, share: number): District => ({
	...district,
	population: Math.round(district.population * share),
	households: Math.round(district.households * share),
});

/** A ring in two, so that the smaller piece lies against the other ring in one run. */
function pieceBeside(ring: Point[], other: Point[]): [Point[], Point[]] {
	for (const part of [0.25, 0.3, 0.2, 0.35]) {
		const pieces = split(ring, part, (piece) => touches(piece, other));
		if (pieces.length === 2) return [pieces[1], pieces[0]];
	}
	throw new Error('No piece lies against the other district');
}

function touches(piece: Point[], other: Point[]): boolean {
	try {
		return joined(other, piece).length > 4;
	} catch {
		return false;
	}
}

/** An eight-cornered islet of some 40 km². */
function islet([lon, lat]: Point): Point[] {
	const ring = Array.from({ length: 8 }, (_, i): Point => {
		const turn = (i * Math.PI) / 4;
		const reach = i % 2 ? 0.032 : 0.038;
		const place = [lon + (Math.cos(turn) * reach) / 0.6, lat + Math.sin(turn) * reach];
		return [Math.round(place[0] * 1e5) / 1e5, Math.round(place[1] * 1e5) / 1e5];
	});
	return [...ring, ring[0]];
}
