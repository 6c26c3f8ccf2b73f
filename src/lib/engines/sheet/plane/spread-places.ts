/**
 * Some of many places on the paper, spread evenly among them, and always the four that lie furthest out, where
 * a map is least true. In: x, y interleaved; the numbers of the places to choose among; about how many to take.
 */
export function spreadPlaces(
	points: ArrayLike<number>,
	among: ArrayLike<number>,
	about: number,
): number[] {
	if (among.length === 0) return [];
	const step = Math.max(1, Math.floor(among.length / about));
	const taken: number[] = [];
	const furthest = [among[0], among[0], among[0], among[0]];
	for (let i = 0; i < among.length; i++) {
		const place = among[i];
		if (i % step === 0) taken.push(place);
		const [x, y] = [points[2 * place], points[2 * place + 1]];
		if (x < points[2 * furthest[0]]) furthest[0] = place;
		if (x > points[2 * furthest[1]]) furthest[1] = place;
		if (y < points[2 * furthest[2] + 1]) furthest[2] = place;
		if (y > points[2 * furthest[3] + 1]) furthest[3] = place;
	}
	return [...new Set([...taken, ...furthest])];
}
