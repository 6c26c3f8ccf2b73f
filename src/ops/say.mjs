/** A failure whose message is all that the reader needs: no stack trace is printed for it. */
export class Explained extends Error {}

/** @param {string} sentence */
export const say = (sentence) => process.stdout.write(sentence + '\n');

/**
 * Says what is being done and, if it took a while, how long it took.
 * @template T
 * @param {string} what @param {() => T | Promise<T>} work
 * @returns {Promise<T>}
 */
export async function timed(what, work) {
	say(`${what} ...`);
	const began = performance.now();
	const result = await work();
	const seconds = (performance.now() - began) / 1000;
	if (seconds >= 1) say(`  done in ${seconds.toFixed(1)} s`);
	return result;
}
