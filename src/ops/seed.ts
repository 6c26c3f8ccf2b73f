import path from 'node:path';
import { config } from '../lib/server/config.ts';
import { disconnect } from '../lib/server/database/connection.ts';
import { demoMember, seedDemoTeam } from './demo-team.ts';
import { readJson, writePrivateJson } from './files.mjs';
import { seedDemoSheet, seedingWorkshop } from './seed-sheets.ts';
import { seedDemoTerritories } from './seed-territories.ts';
import { seedDemoTheme } from './seed-theme.ts';

/** Makes the demo team, or completes it, writes down how to sign in to it, and gives it a sheet with territories and one that shows a measure. */
const { dataDirectory, origin } = config();
const file = path.join(dataDirectory, 'demo.json');
const demo = await seedDemoTeam(readJson(file));
writePrivateJson(file, { url: origin, ...demo });
const shop = seedingWorkshop();
const maker = await demoMember('several');
const made = await seedDemoSheet(shop, maker);
if (made !== null) await seedDemoTheme(shop, maker, made);
await seedDemoTerritories(shop, await demoMember('planner'), 1);
await disconnect();
