import { writeFileSync } from 'node:fs';
import { exportTableCsv } from '../src/lib/engines/exports/data-table.ts';
import { exportWorkbook } from '../src/lib/engines/exports/workbook.ts';
import { asReceived } from './as-received.ts';
import { carelessOffice } from './careless-office.ts';
import { distributor } from './distributor.ts';
import { distributorTables } from './distributor-tables.ts';
import { geojsonText } from './geojson.ts';
import { nextYear } from './next-year.ts';
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
writeFileSync(here('tavaroe-as-received.zip'), carelessOffice(districts));
writeFileSync(here('tavaroe-next-year.geojson'), nextYear(districts));

const firm = distributor(districts, seed);
const { outlets, territories, ferries } = distributorTables(firm);
const workbook = await exportWorkbook([outlets, territories, ferries]);
writeFileSync(here('quellorn-outlets.csv'), exportTableCsv(outlets));
writeFileSync(here('quellorn-territories.csv'), exportTableCsv(territories));
writeFileSync(here('quellorn-ferries.csv'), exportTableCsv(ferries));
writeFileSync(here('quellorn-outlets.xlsx'), workbook);
writeFileSync(here('quellorn-as-received.xlsx'), await asReceived(firm, seed));
