import { register } from 'tsx/esm/api';

/** The thread of `engine.thread.ts` where nothing is built: its TypeScript is read as it is. */
register();
const { default: work } = await import('./engine.thread.ts');

export default work;
