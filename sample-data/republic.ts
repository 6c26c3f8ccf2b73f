import { makeCells } from './cells.ts';
import { makeDistricts } from './districts.ts';
import { landCells } from './land.ts';
import { carveEnclave, carveExclave, findFourCorner } from './oddities.ts';
import { outlines, type Part } from './outline.ts';
import { districtGraph, districtMiddles, makeProvinces } from './provinces.ts';

/** The land before it has names: parts in km on a plane, province numbers from 0. */
export interface Republic {
	districts: { parts: Part[]; province: number }[];
	/** district numbers of the oddities */
	city: number;
	host: number;
	exclave: number;
}

export const districtCount = 180;
export const provinceCount = 11;

/** Shapes the republic: mosaic, land, districts, provinces, then the places that are hard on a map. */
export function shapeRepublic(seed: number): Republic {
	const cells = makeCells(13_000, 345, 262, seed);
	const owner = makeDistricts(cells, landCells(cells, seed), districtCount - 1, seed);
	const city = districtCount - 1;
	const graph = districtGraph(cells, owner, city);
	const province = makeProvinces(graph, districtMiddles(cells, owner, city), provinceCount, seed);
	const host = carveEnclave(cells, owner, city);
	const exclave = carveExclave(cells, owner, districtCount);
	const corner = findFourCorner(cells, owner, districtCount);
	const parts = outlines(cells, owner, districtCount, corner, seed);
	const districts = parts.map((list, district) => ({
		parts: list,
		province: province[district === city ? host : district],
	}));
	return { districts, city, host, exclave };
}
