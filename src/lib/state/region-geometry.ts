import type { UnitGeometry } from '$lib/engines/territories';

export type GeometryReply = UnitGeometry | { failed: string };

/**
 * Asks a worker for the places, sizes and outlines of a sheet's regions, for travel and shape.
 * @returns ends the worker, whether it has answered or not
 */
export function askGeometry(
	makeWorker: () => Worker,
	address: string,
	answered: (reply: GeometryReply) => void,
): () => void {
	const worker = makeWorker();
	worker.onmessage = ({ data }: MessageEvent<GeometryReply>) => {
		worker.terminate();
		answered(data);
	};
	worker.onerror = ({ message }) => {
		worker.terminate();
		answered({ failed: message });
	};
	worker.postMessage(address);
	return () => worker.terminate();
}
