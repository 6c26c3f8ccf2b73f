/** What the page needs to know of a drawn sheet beside the SVG itself. Lengths in millimetres. */
export interface DrawnSheet {
	svg: string;
	widthMm: number;
	heightMm: number;
	/** x, y of a place inside the largest part of each region, interleaved */
	anchors: Float64Array;
	/** printed size of each region: the side of a square of its area */
	sizesMm: Float64Array;
	/** path of the shared line of each border, in hundredths of a millimetre; '' for a point touch */
	borderPath: (border: number) => string;
	/** x, y in millimetres of the place of a border or of degrees near the map; null when off it */
	placeOf: (lon: number, lat: number) => [number, number] | null;
	/** name of the projection, in words */
	projection: string;
	/** labels that did not fit */
	unplaced: readonly number[];
	notes: { projection: string; scale: string };
}
