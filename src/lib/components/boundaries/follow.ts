/** milliseconds between two questions to the server; longer while it cannot be reached */
const [pace, patience] = [700, 2800];

/**
 * Asks an address again and again for how far a reading is. A lost connection is said, and asked again.
 * @returns ends the asking
 */
export function follow<Status>(
	address: string,
	heard: { told: (status: Status) => void; reached: (yes: boolean) => void },
): () => void {
	let ended = false;
	let timer: ReturnType<typeof setTimeout>;
	async function ask() {
		const status = await answerFrom<Status>(address);
		if (ended) return;
		heard.reached(status !== null);
		timer = setTimeout(ask, status === null ? patience : pace);
		if (status !== null) heard.told(status);
	}
	void ask();
	return () => {
		ended = true;
		clearTimeout(timer);
	};
}

async function answerFrom<Status>(address: string): Promise<Status | null> {
	try {
		const response = await fetch(address);
		return response.ok ? ((await response.json()) as Status) : null;
	} catch {
		return null;
	}
}
