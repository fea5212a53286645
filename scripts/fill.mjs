// `npm run fill`: 200 campaigns, 20,000 runs, 100,000 readings and what goes with them, into the database that
// DATABASE_URL names, or into the one of `npm start` while it runs.
import { join } from 'node:path';
import { fill, fullSize } from './parts/fill/fill.mjs';
import { runningMariadb } from './parts/mariadb.mjs';
import { giveUp, say } from './parts/words.mjs';

const running = runningMariadb(join(process.env.DATA_DIR || 'data', 'mariadb'));
const url = process.env.DATABASE_URL || (running && `${running.url}calipress`);
if (!url) giveUp('Nothing to fill: name a database with DATABASE_URL, or run npm start beside this.');
const began = Date.now();
const { tag } = await fill(url, fullSize).catch((error) =>
	giveUp(`Nothing was filled in: ${error instanceof Error ? error.message : error}`)
);
const { campaigns, runs, readings } = fullSize;
say(`${campaigns} campaigns, ${runs} runs, ${readings} readings in ${(Date.now() - began) / 1000} s.`);
say(`Their names begin with ${tag}.`);
