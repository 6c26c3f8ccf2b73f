import { readFileSync } from 'node:fs';

/**
 * Megabytes that this process has held at most. Not maxRSS of getrusage where it can be helped: a new
 * process takes that over from the one that started it (getrusage(2)).
 */
export function peakMegabytes(): number {
	const kilobytes = highWater() ?? process.resourceUsage().maxRSS;
	return Math.round(kilobytes / 1024);
}

function highWater(): number | null {
	if (process.platform !== 'linux') return null;
	const found = /^VmHWM:\s+(\d+) kB/m.exec(readFileSync('/proc/self/status', 'utf8'));
	return found && Number(found[1]);
}
