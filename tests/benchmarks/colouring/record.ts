import { cpuUsage } from 'node:process';

export interface ColouringRecord {
	name: string;
	regions: number;
	milliseconds: number;
	/** what was hoped for; absent where a figure is only told */
	goalMilliseconds?: number;
	met?: boolean;
	[more: string]: number | string | boolean | null | undefined;
}

/** A record that says whether its goal was met. */
export function record(given: ColouringRecord): ColouringRecord {
	const { goalMilliseconds, milliseconds } = given;
	if (goalMilliseconds === undefined) return given;
	return { ...given, met: milliseconds <= goalMilliseconds && given.met !== false };
}

/** The middle of the times of so many runs, in milliseconds of the clock on the wall. */
export async function median(runs: number, work: () => unknown): Promise<number> {
	const times: number[] = [];
	for (let i = 0; i < runs; i++) {
		const started = performance.now();
		await work();
		times.push(performance.now() - started);
	}
	times.sort((a, b) => a - b);
	return Math.round(times[runs >> 1] * 100) / 100;
}

/** Milliseconds that this process has had a processor for, which other work does not lengthen. */
export const processorTime = (): number => Math.round(cpuUsage().user / 1000);
