import { area } from '@turf/turf';
import { strToU8, zipSync } from 'fflate';
import type { Geometry } from 'geojson';
import { describe, expect, it } from 'vitest';
import { placemark, writeKml } from '../../../../../tests/support/kml.ts';
import { accepted, box, refusal } from '../../../../../tests/support/read-boundaries.ts';

/** The example of a polygon with a hole in the reference of KML 2.2, from memory. */
const pentagon = `<?xml version="1.0" encoding="UTF-8"?>
<kml xmlns="http://www.opengis.net/kml/2.2">
<Placemark>
  <name>The Pentagon</name>
  <Polygon>
    <extrude>1</extrude>
    <altitudeMode>relativeToGround</altitudeMode>
    <outerBoundaryIs>
      <LinearRing>
        <coordinates>
          -77.05788457660967,38.87253259892824,100
          -77.05465973756702,38.87291016281703,100
          -77.05315536854791,38.87053267794386,100
          -77.05552622493516,38.868757801256,100
          -77.05844056290393,38.86996206506943,100
          -77.05788457660967,38.87253259892824,100
        </coordinates>
      </LinearRing>
    </outerBoundaryIs>
    <innerBoundaryIs>
      <LinearRing>
        <coordinates>
          -77.05668055019126,38.87154239798456,100
          -77.05542625960818,38.87167890344077,100
          -77.05485125901024,38.87076535397792,100
          -77.05577677433152,38.87008686581446,100
          -77.05691162017543,38.87054446963351,100
          -77.05668055019126,38.87154239798456,100
        </coordinates>
      </LinearRing>
    </innerBoundaryIs>
  </Polygon>
</Placemark>
</kml>`;

const read = (kml: string, options?: object) => accepted(strToU8(kml), options);
const refused = (kml: string) => refusal(strToU8(kml));
const two = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)];
const shape = placemark(two[0]).replace(/<\/?Placemark[^>]*>/g, '');

describe('what is read', () => {
	it('the pentagon of the reference, with its hole', async () => {
		const { coverage, source } = await read(pentagon);
		expect(coverage.names).toEqual(['The Pentagon']);
		expect([...coverage.partRings]).toEqual([0, 2]);
		const numbers = [...pentagon.matchAll(/(-77\.\d+),(38\.\d+),100/g)].map((m) => [+m[1], +m[2]]);
		const geometry: Geometry = {
			type: 'Polygon',
			coordinates: [numbers.slice(0, 6), numbers.slice(6)],
		};
		// turf works on a sphere, so the areas agree to some tenths of a percent
		expect(coverage.areasKm2[0] / (area(geometry) / 1e6)).toBeCloseTo(1, 2);
		expect(source).toMatchObject({ format: 'KML', crs: 'EPSG:4326', encoding: 'UTF-8' });
	});

	it('names, values, schema kinds, folders and identifiers', async () => {
		const kml = `<kml xmlns="http://www.opengis.net/kml/2.2"><Document><name>Wards</name>
			<Schema id="s"><SimpleField name="people" type="int"/><SimpleField name="code" type="string"/></Schema>
			<Folder><name>North</name><Folder><name>Hill &amp; dale</name>
			<Placemark id="p1"><name>One</name><description><![CDATA[<b>first</b>]]></description>
			<ExtendedData><SchemaData schemaUrl="#s"><SimpleData name="people">12</SimpleData>
			<SimpleData name="code">007</SimpleData></SchemaData></ExtendedData>${shape}</Placemark></Folder></Folder>
			<Placemark id="p2"><name>Two</name><ExtendedData><Data name="__proto__"><value>x</value></Data></ExtendedData>
			${placemark(two[1]).replace(/<\/?Placemark[^>]*>/g, '')}</Placemark></Document></kml>`;
		const { coverage, attributes, source } = await read(kml);
		expect(coverage.keys).toEqual(['p1', 'p2']);
		expect(coverage.names).toEqual(['One', 'Two']);
		expect(source.layer).toBe('Wards');
		expect(attributes.columns).toEqual([
			'name',
			'people',
			'code',
			'folder',
			'description',
			'__proto__',
		]);
		expect(attributes.rows).toEqual([
			['One', 12, '007', 'North / Hill & dale', '<b>first</b>', null],
			['Two', null, null, null, null, 'x'],
		]);
		expect((await read(kml, { keyField: 'name' })).coverage.keys).toEqual(['One', 'Two']);
	});

	it('tuples with white space after their commas, prefixes of names, and other encodings', async () => {
		const spaced = writeKml(two)
			.replaceAll(',', ', ')
			.replaceAll('<coordinates>', '<coordinates>\n');
		expect((await read(spaced)).coverage.keys).toEqual(['a', 'b']);
		const prefixed = writeKml(two)
			.replace(/<(\/?)([A-Z])/g, '<$1k:$2')
			.replace('xmlns=', 'xmlns:k=');
		expect((await read(prefixed)).coverage.keys).toEqual(['a', 'b']);
		const named = `<?xml version="1.0" encoding="ISO-8859-1"?>${pentagon.slice(38).replace('The', 'Th\u00e9')}`;
		const { coverage } = await accepted(Uint8Array.from(named, (c) => c.charCodeAt(0)));
		expect(coverage.names).toEqual(['Thé Pentagon']);
	});

	it('areas among points and lines, which are counted and told', async () => {
		const point = '<Placemark><Point><coordinates>0.5,0.5</coordinates></Point></Placemark>';
		const line = '<LineString><coordinates>0,0 1,1</coordinates></LineString>';
		const mixed = `<MultiGeometry>${shape}${line}</MultiGeometry>`;
		const { findings, coverage } = await read(
			writeKml([two[1]], ['', `${point}<Placemark>${mixed}</Placemark>`]),
		);
		expect(coverage.keys).toHaveLength(2);
		const told = findings.find(({ code }) => code === 'mixed-geometry');
		expect(told?.message).toContain('1 point and 1 line');
	});

	it('an archive by its doc.kml, whatever else lies in it', async () => {
		const kmz = zipSync({
			'files/other.kml': strToU8('<kml/>'),
			'doc.kml': strToU8(writeKml(two)),
			'files/x.png': new Uint8Array(3),
		});
		const { coverage, source } = await accepted(kmz);
		expect([coverage.keys, source.format]).toEqual([['a', 'b'], 'KML']);
	});

	it('links are not followed, and that is told', async () => {
		const link = '<NetworkLink><Link><href>https://example.org/x.kml</href></Link></NetworkLink>';
		const { findings } = await read(writeKml(two, [link, '']));
		expect(findings.map(({ code }) => code)).toContain('link-not-followed');
	});
});

describe('what is refused', () => {
	const bomb = `<?xml version="1.0"?><!DOCTYPE kml [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;&a;&a;">]>`;
	const outside = `<!DOCTYPE kml [<!ENTITY x SYSTEM "file:///etc/passwd">]>`;
	it.each([
		['entities that expand', `${bomb}<kml>&b;</kml>`, 'unsupported-format', /document type/],
		['entities from outside', `${outside}<kml>&x;</kml>`, 'unsupported-format', /document type/],
		['an entity never declared', '<kml>&x;</kml>', 'file-damaged', /entity/],
		[
			'another kind of XML',
			'<gml:x xmlns:gml="g"/>',
			'unsupported-format',
			/outermost element is "x"/,
		],
		['a file cut off', writeKml(two).slice(0, -120), 'file-truncated', /ends inside feature 2/],
		['tags that do not match', '<kml><Document></kml>', 'file-damaged', /not well-formed/],
		[
			'200,000 elements in one another',
			`<kml>${'<Folder>'.repeat(200_000)}`,
			'file-damaged',
			/deeper/,
		],
		[
			'a position of one number',
			writeKml(two).replace('0,0 ', '0 '),
			'bad-coordinate',
			/Feature 1/,
		],
		['no number', writeKml(two).replace('1,0 ', 'NaN,0 '), 'bad-coordinate', /"NaN/],
		['too large a number', writeKml(two).replace('1,0 ', '1e999,0 '), 'bad-coordinate', /"1e999/],
		['points alone', '<kml><Placemark><Point/></Placemark></kml>', 'no-areas', /only 1 point/],
		['nothing', '<kml/>', 'no-areas', /no areas/],
		[
			'a hole before its outline',
			writeKml(two).replaceAll('outer', 'inner'),
			'file-damaged',
			/inner/,
		],
	])('%s', async (_, kml, code, said) => {
		const { code: got, message } = await refused(kml);
		expect(got, message).toBe(code);
		expect(message).toMatch(said);
	});
});
