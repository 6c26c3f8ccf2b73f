import type * as tasks from './work.ts';

/** The computations that run in threads, by name: `work.ts` is the list. */
type Tasks = typeof tasks;
export type TaskName = keyof Tasks;

/** What a task is handed: its input, and where to say how far it is. */
export type TaskInput<N extends TaskName> = Parameters<Tasks[N]>[0]['input'];
export type TaskOutput<N extends TaskName> = Awaited<ReturnType<Tasks[N]>>;

export interface Progress {
	/** what is being done, in words */
	step: string;
	/** 0 to 1 */
	share: number;
}
