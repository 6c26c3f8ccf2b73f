import type { Pool } from './pool.ts';
import type { TaskInput, TaskName, TaskOutput } from './tasks.ts';
import * as tasks from './work.ts';

/** The tasks without threads, for programs that have nobody to hold up, such as the one that makes demo data. */
export const inlinePool = (): Pool => ({
	async run<N extends TaskName>(name: N, input: TaskInput<N>): Promise<TaskOutput<N>> {
		const task = tasks[name] as (message: { input: TaskInput<N> }) => unknown;
		return (await task({ input })) as TaskOutput<N>;
	},
	warm: () => undefined,
	close: async () => undefined,
});
