import path from 'node:path';
import { config } from '../lib/server/config.ts';
import { disconnect } from '../lib/server/database/connection.ts';
import { seedDemoTeam } from './demo-team.ts';
import { readJson, writePrivateJson } from './files.mjs';

/** Makes the demo team, or completes it, and writes down how to sign in to it. */
const { dataDirectory, origin } = config();
const file = path.join(dataDirectory, 'demo.json');
const demo = await seedDemoTeam(readJson(file));
writePrivateJson(file, { url: origin, ...demo });
await disconnect();
