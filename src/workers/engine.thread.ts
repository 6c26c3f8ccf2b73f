import * as tasks from '../lib/server/jobs/work.ts';

/** A thread: one message in, one answer out. The tasks are listed in `jobs/work.ts`. */
export default function work(message: {
	name: keyof typeof tasks;
	input: never;
	port?: never;
}): unknown {
	return tasks[message.name](message);
}
