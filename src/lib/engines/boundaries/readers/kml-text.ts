import { Refusal } from '../refusal.ts';

/**
 * The longitudes and latitudes of a KML coordinates text (OGC 07-147r2, 10.5.3), interleaved; heights are
 * passed over. Tuples stand between white space, their numbers between commas; white space after a comma,
 * which the standard forbids and files have, is taken as part of the tuple.
 */
export function kmlPositions(text: string, place: string): number[] {
	const positions: number[] = [];
	let at = skipSpace(text, 0);
	while (at < text.length) {
		let numbers = 0;
		for (let more = true; more; numbers++) {
			const from = (at = skipSpace(text, at));
			for (let c = text.charCodeAt(at); c > 32 && c !== 44; c = text.charCodeAt(++at));
			const value = at > from ? Number(text.slice(from, at)) : NaN;
			if (numbers < 3 && !Number.isFinite(value))
				throw notNumber(text.slice(from, from + 12), place);
			if (numbers < 2) positions.push(value);
			at = skipSpace(text, at);
			more = text.charCodeAt(at) === 44;
			if (more) at++;
		}
		if (numbers < 2) throw notNumber(text.slice(at - 12, at), place);
	}
	return positions;
}

function skipSpace(text: string, at: number): number {
	while (at < text.length && text.charCodeAt(at) <= 32) at++;
	return at;
}

function notNumber(shown: string, place: string): Refusal {
	const message = `${place} has a position that is not two or three numbers ("${shown.trim()}").`;
	return new Refusal('bad-coordinate', message);
}
