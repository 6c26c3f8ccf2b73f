import { isHopeless, type Case } from './explain-case.ts';

/**
 * Demands that collide at sight, as lists of one or two: an ink that is forbidden or beyond the number
 * of inks, two inks for regions kept alike, one ink for two regions that border.
 */
export function immediateCollisions(of: Case): number[][] {
	const { graph, demands, demandsAt } = of;
	const hopeless = demands.map((demand) => isHopeless(of, demand));
	const found: number[][] = [];
	demands.forEach((demand, d) => {
		if (hopeless[d]) {
			found.push([d]);
			return;
		}
		const { vertex, ink } = demand;
		for (const other of demandsAt.get(vertex) ?? []) {
			if (other > d && !hopeless[other]) found.push([d, other]);
		}
		for (let e = graph.offsets[vertex]; e < graph.offsets[vertex + 1]; e++) {
			for (const other of demandsAt.get(graph.targets[e]) ?? []) {
				if (other > d && !hopeless[other] && demands[other].ink === ink) found.push([d, other]);
			}
		}
	});
	return found;
}
