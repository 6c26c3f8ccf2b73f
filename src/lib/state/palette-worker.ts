import type { Parting, PartingQuestion } from '$lib/engines/colouring/part-inks';
import type { ProposalAnswer, ProposalRequest } from '$lib/engines/palettes';

export type PaletteQuestion = { mend: ProposalRequest } | { part: PartingQuestion };
export type PaletteReply =
	{ answer: ProposalAnswer } | { ended: true } | { parting: Parting } | { failed: string };

/** One question to a worker of its own: what it says is heard until it is dropped or another is asked. */
export class PaletteWorker {
	#worker: Worker | null = null;

	constructor(private readonly makeWorker: () => Worker) {}

	ask(question: PaletteQuestion, hear: (reply: PaletteReply) => void) {
		this.drop();
		const worker = (this.#worker = this.makeWorker());
		const heard = (reply: PaletteReply) => {
			if (worker !== this.#worker) return;
			if (!('answer' in reply)) this.drop();
			hear(reply);
		};
		worker.onmessage = ({ data }: MessageEvent<PaletteReply>) => heard(data);
		worker.onerror = ({ message }) => heard({ failed: message });
		worker.postMessage(question);
	}

	drop() {
		this.#worker?.terminate();
		this.#worker = null;
	}
}
