import { RawLayer } from '../raw-layer.ts';
import { Cancelled, Refusal } from '../refusal.ts';
import type { ByteSource, Limits, Watch } from '../options.ts';
import { byte, JsonBytes, needMore } from './json-bytes.ts';
import { idOf, nameOf, objectOrNull, readFeature, type LoneFeature } from './geojson-feature.ts';
import {
	checkGeometry,
	notGeoJson,
	readGeometry,
	readGeometryMember,
	type GeometryMembers,
} from './geojson-geometry.ts';
import { Window } from './window.ts';

/** Thrown on the members that only TopoJSON has: the file must be read by its own reader. */
export class IsTopology extends Error {}

const recordSeparator = 30;
/**
 * Memory is asked for ahead, for as many points as the file holds when each takes this many bytes, and
 * for no more than so many points: the system hands it out only as it is used.
 */
const usualPointBytes = 20;
const mostAhead = 30_000_000;
const topologyMembers = new Set(['arcs', 'objects', 'transform']);

/**
 * GeoJSON (RFC 7946 and the older `crs` member), GeoJSON text sequences (RFC 8142) and one feature a
 * line, read in one pass over the bytes. Memory: the flat result and a window of a few megabytes, more
 * only where a single feature is larger. A feature that runs past the window is started again.
 */
export async function readGeoJson(
	source: ByteSource,
	limits: Limits,
	watch: Watch,
): Promise<RawLayer> {
	const layer = new RawLayer(limits, Math.min(Math.ceil(source.size / usualPointBytes), mostAhead));
	layer.format = 'GeoJSON';
	layer.crsByFormat = 'EPSG:4326';
	const json = new JsonBytes(limits.nesting);
	const reader = new RootReader(json, layer);
	const window = new Window(source, json);
	try {
		while (await window.more()) {
			if (watch.cancelled?.()) throw new Cancelled();
			watch.progress?.(`Reading features (${layer.regions} so far)`, window.share());
			while (step(reader, window));
		}
	} finally {
		await window.close();
	}
	layer.encoding = json.encoding;
	return layer;
}

/** Reads one unit; false when the window must grow or slide first. */
function step(reader: RootReader, window: Window): boolean {
	const before = reader.mark();
	try {
		const going = reader.next();
		if (!going) window.done = true;
		return going;
	} catch (error) {
		if (error !== needMore) throw error;
		reader.backTo(before);
		return false;
	}
}

type Stage = 'root' | 'members' | 'features' | 'after-feature';

/** Walks the outermost object unit by unit: a member of the root, or one feature. */
class RootReader {
	private stage: Stage = 'root';
	private roots = 0;
	private first = true;
	private members: GeometryMembers = { depth: 0 };
	private lone: LoneFeature | null = null;
	private sawFeatures = false;

	constructor(
		private json: JsonBytes,
		private layer: RawLayer,
	) {}

	mark() {
		const { stage, roots, first, members, lone, sawFeatures } = this;
		const kept = {
			stage,
			roots,
			first,
			members: { ...members },
			lone: lone && { ...lone },
			sawFeatures,
		};
		return { at: this.json.at, feature: this.json.feature, layer: this.layer.mark(), kept };
	}

	backTo(mark: ReturnType<RootReader['mark']>): void {
		this.json.at = mark.at;
		this.json.feature = mark.feature;
		this.layer.backTo(mark.layer);
		Object.assign(this, mark.kept);
	}

	/** One unit further; false at the end of the file. */
	next(): boolean {
		if (this.stage === 'root') return this.root();
		if (this.stage === 'members') this.member();
		else if (this.stage === 'features') this.featureOrEnd();
		else this.afterFeature();
		return true;
	}

	private root(): boolean {
		const { json } = this;
		while (json.at < json.bytes.length && isBetween(json.bytes[json.at])) json.at++;
		if (json.at === json.bytes.length) {
			if (!json.last) throw needMore;
			if (this.roots === 0)
				throw new Refusal('empty-file', 'The file holds nothing but white space.');
			return false;
		}
		if (json.peek() !== byte.openObject) {
			if (this.roots) throw json.notJson('something follows the end of the map');
			throw startsWrong(json);
		}
		json.at++;
		Object.assign(this, { stage: 'members', first: true, members: { depth: 0 }, lone: null });
		this.sawFeatures = false;
		return true;
	}

	private member(): void {
		const { json } = this;
		if (this.first && json.peek() === byte.closeObject) json.at++;
		else if (this.first || json.another(byte.closeObject)) {
			this.first = false;
			const name = json.string();
			json.take(byte.colon);
			return this.named(name);
		}
		this.endRoot();
	}

	private named(name: string): void {
		const { json, layer } = this;
		if (name === 'features') {
			json.take(byte.open);
			this.sawFeatures = true;
			this.stage = 'features';
			this.first = true;
		} else if (name === 'crs') layer.crs = legacyCrs(json.value()) ?? layer.crs;
		else if (topologyMembers.has(name)) throw new IsTopology();
		else if (name === 'name' && !this.lone) layer.layer = nameOf(json.value());
		else if (name === 'type') this.typed(String(json.value()));
		else if (name === 'geometry' || name === 'coordinates' || name === 'geometries') {
			this.startLone();
			if (name === 'geometry') readGeometry(json, layer);
			else readGeometryMember(json, layer, name, this.members);
		} else if (name === 'properties') this.startLone().properties = objectOrNull(json.value());
		else if (name === 'id') this.startLone().id = idOf(json.value());
		else json.skip();
	}

	private typed(type: string): void {
		if (type === 'Topology') throw new IsTopology();
		this.members.type = type;
	}

	/** The root is itself a feature or a geometry. */
	private startLone(): LoneFeature {
		if (this.lone) return this.lone;
		this.json.feature = this.layer.regions + 1;
		this.layer.startRegion();
		return (this.lone = { id: null, properties: null });
	}

	private featureOrEnd(): void {
		const { json } = this;
		if (this.first && json.peek() === byte.close) {
			json.at++;
			this.stage = 'members';
			this.first = false;
			return;
		}
		this.first = false;
		readFeature(json, this.layer);
		this.stage = 'after-feature';
	}

	private afterFeature(): void {
		this.stage = this.json.another(byte.close) ? 'features' : 'members';
		if (this.stage === 'members') this.json.feature = 0;
	}

	private endRoot(): void {
		const { type } = this.members;
		if (this.lone && this.sawFeatures) throw notGeoJson(this.json, 'a feature holds features');
		if (this.lone) {
			if (type !== 'Feature') checkGeometry(this.json, this.members, this.layer);
			this.layer.table.add(this.lone.id, this.lone.properties);
			this.json.feature = 0;
		} else if (!this.sawFeatures) {
			throw notGeoJson(this.json, 'it has neither features nor a geometry');
		}
		this.roots++;
		this.stage = 'root';
	}
}

const isBetween = (c: number) =>
	c === recordSeparator || c === 32 || c === 10 || c === 13 || c === 9;

/** The `crs` member of the 2008 text of GeoJSON: a name, or a link, which is not followed. */
function legacyCrs(value: unknown): string | null {
	if (typeof value !== 'object' || value === null) return null;
	const { properties } = value as { properties?: { name?: unknown; code?: unknown } };
	if (typeof properties?.name === 'string') return properties.name;
	return properties?.code === undefined ? null : `EPSG:${String(properties.code)}`;
}

function startsWrong(json: JsonBytes): Refusal {
	const start = json.bytes[json.at];
	if (start === byte.open) return notGeoJson(json, 'it begins with a list');
	return new Refusal('unsupported-format', 'The file is neither GeoJSON nor TopoJSON.');
}
