import { readFileSync } from 'node:fs';
import type { FeatureCollection, MultiPolygon, Polygon } from 'geojson';
import { neighbors } from 'topojson-client';
import { topology } from 'topojson-server';
import type { GeometryCollection } from 'topojson-specification';
import { peakMegabytes } from './peak.ts';
import { Stopwatch } from './stopwatch.ts';

/** File to neighbours by JSON.parse, topojson-server and topojson-client: `topojson.ts FILE`. A JSON line. */
const whole = new Stopwatch();
const areas = JSON.parse(readFileSync(process.argv[2], 'utf8')) as FeatureCollection<
	Polygon | MultiPolygon
>;
const made = topology({ areas });
const lists = neighbors((made.objects.areas as GeometryCollection).geometries);
const times = whole.taken();
const pairs = lists.reduce((sum, list) => sum + list.length, 0) / 2;
console.log(JSON.stringify({ ...times, peakMegabytes: peakMegabytes(), pairs }));
