import path from 'node:path';
import { config } from '../lib/server/config.ts';
import { disconnect } from '../lib/server/database/connection.ts';
import { demoMember, seedDemoTeam } from './demo-team.ts';
import { readJson, writePrivateJson } from './files.mjs';
import { seedDemoSheets, seedingWorkshop } from './seed-sheets.ts';
import { seedDemoTerritories } from './seed-territories.ts';

/** Makes the demo team, or completes it, writes down how to sign in to it, and gives it a sheet with territories. */
const { dataDirectory, origin } = config();
const file = path.join(dataDirectory, 'demo.json');
const demo = await seedDemoTeam(readJson(file));
writePrivateJson(file, { url: origin, ...demo });
await seedDemoSheets(await demoMember('several'));
await seedDemoTerritories(seedingWorkshop(), await demoMember('planner'), 1);
await disconnect();
