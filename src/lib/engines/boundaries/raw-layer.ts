import { GrowingFloats, GrowingInts } from '../geometry/growing.ts';
import { Refusal } from './refusal.ts';
import { AttributeTable } from './attribute-table.ts';
import type { Finding } from './finding.ts';
import type { FoundLayer } from './question.ts';
import type { Limits } from './options.ts';

/** Regions as a file holds them: points as written, rings of parts of regions, each started in turn. */
export class RawLayer {
	points: GrowingFloats;
	/** first point of each ring, of parts their first ring, of regions their first part */
	ringStarts = new GrowingInts();
	partRings = new GrowingInts();
	regionParts = new GrowingInts();
	table = new AttributeTable();
	/** the coordinate system the file declares: a name, WKT or PROJ string; null when it is silent */
	crs: string | null = null;
	/** the format's own rule when the file is silent: GeoJSON is in degrees, a shapefile is unknown */
	crsByFormat: string | null = null;
	encoding = 'UTF-8';
	format = '';
	layer: string | null = null;
	/** all layers of the file, the one that was read among them; empty where the format has none */
	layers: FoundLayer[] = [];
	/** whether the format is known for files that have latitude first, so that both orders occur */
	axesVary = false;
	/** geometries that are points and lines, which make no region */
	strayPoints = 0;
	strayLines = 0;
	findings: Finding[] = [];

	private mostNumbers: number;

	constructor(
		private limits: Limits,
		expectedPoints = 1024,
	) {
		this.points = new GrowingFloats(2 * expectedPoints);
		this.mostNumbers = 2 * limits.points;
	}

	get regions(): number {
		return this.regionParts.length;
	}
	startRegion(): void {
		if (this.regions >= this.limits.regions) {
			throw new Refusal(
				'too-large-unpacked',
				`The file has more than ${this.limits.regions} features, which is the most this reader takes.`,
			);
		}
		this.regionParts.push(this.partRings.length);
	}
	startPart(): void {
		this.partRings.push(this.ringStarts.length);
	}
	startRing(): void {
		this.ringStarts.push(this.points.length / 2);
	}
	point(x: number, y: number): void {
		this.points.push2(x, y);
		if (this.points.length > this.mostNumbers) {
			throw new Refusal(
				'too-large-unpacked',
				`The file has more than ${this.limits.points} points, which is the most this reader takes.`,
			);
		}
	}
	/** Notes a geometry without area, by the name of its kind. */
	stray(kind: string): void {
		if (/point/i.test(kind)) this.strayPoints++;
		else this.strayLines++;
	}
	/** Lets go of the points once outlines have been made of them: in a large file they fill most memory. */
	releasePoints(): void {
		this.points = new GrowingFloats(0);
	}
	/** A place to come back to when a feature has to be read again from its start. */
	mark(): number[] {
		return [
			this.points.length,
			this.ringStarts.length,
			this.partRings.length,
			this.regionParts.length,
			this.strayPoints,
			this.strayLines,
		];
	}
	backTo(mark: number[]): void {
		[this.points.length, this.ringStarts.length, this.partRings.length, this.regionParts.length] =
			mark;
		[this.strayPoints, this.strayLines] = mark.slice(4);
	}
	pointsBefore(ring: number): number {
		return ring < this.ringStarts.length ? this.ringStarts.items[ring] : this.points.length / 2;
	}
	ringsBefore(part: number): number {
		return part < this.partRings.length ? this.partRings.items[part] : this.ringStarts.length;
	}
	partsBefore(region: number): number {
		return region < this.regions ? this.regionParts.items[region] : this.partRings.length;
	}
}
