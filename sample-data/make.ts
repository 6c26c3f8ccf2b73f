import { writeFileSync } from 'node:fs';
import { geojsonText } from './geojson.ts';
import { shapeRepublic } from './republic.ts';
import { secondSupplier } from './second-supplier.ts';
import { shapefileZip } from './shapefile.ts';
import { survey } from './survey.ts';

/** The same number gives the same republic, byte for byte. */
const seed = 21;

const here = (name: string) => new URL(name, import.meta.url);

const districts = survey(shapeRepublic(seed), seed);
writeFileSync(here('tavaroe.geojson'), geojsonText(districts, 'Districts of Tavaröe'));
writeFileSync(here('tavaroe-survey-grid.zip'), shapefileZip(districts, 'tavaroe'));
writeFileSync(here('tavaroe-second-supplier.geojson'), secondSupplier(districts, seed));
