import { readFileSync } from 'node:fs';
import { readBoundaries } from '../../src/lib/engines/boundaries/index.ts';
import { fileSource } from '../../src/lib/server/jobs/file-source.ts';

/** Reads the file named on the command line in a process of its own; prints what came of it as JSON. */
const result = await readBoundaries(fileSource(process.argv[2], 'upload'));
const read = result.status === 'refused' ? { code: result.code, message: result.message } : {};
// not maxRSS of getrusage, which a new process takes over from the one that started it (getrusage(2))
const [, kilobytes] = /^VmHWM:\s+(\d+) kB/m.exec(readFileSync('/proc/self/status', 'utf8')) ?? [];
const peakMegabytes = Math.round(Number(kilobytes) / 1024);
console.log(JSON.stringify({ status: result.status, ...read, peakMegabytes }));
