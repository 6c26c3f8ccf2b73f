import path from 'node:path';
import { config } from '../lib/server/config.ts';
import { disconnect } from '../lib/server/database/connection.ts';
import { demoMember, seedDemoTeam } from './demo-team.ts';
import { readJson, writePrivateJson } from './files.mjs';
import { seedDemoSheets } from './seed-sheets.ts';

/** Makes the demo team, or completes it, writes down how to sign in to it, and gives it a sheet. */
const { dataDirectory, origin } = config();
const file = path.join(dataDirectory, 'demo.json');
const demo = await seedDemoTeam(readJson(file));
writePrivateJson(file, { url: origin, ...demo });
await seedDemoSheets(await demoMember('several'));
await disconnect();
