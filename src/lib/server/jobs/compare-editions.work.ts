import { changeSentences, differences, type Comparable } from '../../engines/editions/index.ts';
import type { Task } from './task-port.ts';

/** What changed from one edition to another, in sentences; those of large sheets take a while. */
export const compareEditions = ({
	input: { before, after },
}: Task<{ before: Comparable; after: Comparable }>): string[] =>
	changeSentences(differences(before, after));
