/** Wall clock and processor time, from when it was made. */
export class Stopwatch {
	private wall = performance.now();
	private cpu = process.cpuUsage();

	taken(): { milliseconds: number; processorMilliseconds: number } {
		const { user, system } = process.cpuUsage(this.cpu);
		return {
			milliseconds: Math.round(performance.now() - this.wall),
			processorMilliseconds: Math.round((user + system) / 1000),
		};
	}
}
