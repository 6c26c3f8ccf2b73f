import { database, disconnect } from '../lib/server/database/connection.ts';
import { migrateToLatest } from '../lib/server/database/migrator.ts';

const names = await migrateToLatest(database());
for (const name of names) process.stdout.write(`  ${name}\n`);
await disconnect();
