import { ApiFault, faultBody } from './fault.ts';

/** What a check answers, ready to be sent: made in a thread, so that writing it holds nobody up. */
export interface Answer {
	status: number;
	body: string;
}

/** Runs a check and writes its answer; a fault of the one who asked is an answer too. */
export async function answered(work: () => object | Promise<object>): Promise<Answer> {
	try {
		return { status: 200, body: JSON.stringify(await work()) };
	} catch (problem) {
		if (!(problem instanceof ApiFault)) throw problem;
		return { status: problem.status, body: faultBody(problem) };
	}
}

/** Milliseconds since then, for `stats`. */
export const statsSince = (started: number) => ({
	milliseconds: Math.round((performance.now() - started) * 1000) / 1000,
});
