// `npm run bench`: a line per figure, `name value control ratio goal`; product and control in the same run, on a
// database and with a mail fake of this run's own. Ends with an error when a figure misses its goal.
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { measureArticle } from './parts/bench/article.mjs';
import { measureCoverage } from './parts/bench/coverage.mjs';
import { measureEditor } from './parts/bench/editor.mjs';
import { lineOf } from './parts/bench/figure.mjs';
import { measureJobs } from './parts/bench/jobs.mjs';
import { measureLive } from './parts/bench/live.mjs';
import { measurePages } from './parts/bench/pages.mjs';
import { measureStatistics } from './parts/bench/statistics.mjs';
import { measureTable } from './parts/bench/table.mjs';
import { ensureBuild } from './parts/build.mjs';
import { startMaildev } from './parts/maildev.mjs';
import { startMariadb } from './parts/mariadb.mjs';
import {
	browserPrograms,
	checkNode,
	databasePrograms,
	ensureDebian,
	ensureModules
} from './parts/packages.mjs';
import { say } from './parts/words.mjs';

process.chdir(new URL('..', import.meta.url).pathname);
checkNode();
ensureModules();
ensureDebian({ ...databasePrograms, ...browserPrograms });
ensureBuild();

let missed = 0;
const print = /** @param {import('./parts/bench/figure.mjs').Figure} figure */ (figure) => {
	if (!figure.met) missed += 1;
	say(lineOf(figure));
};
say('name                                  value    control    ratio   goal');

// On the disk, as a lab's own would be.
const folder = mkdtempSync(join(tmpdir(), 'calipress-bench-'));
const server = await startMariadb({ folder: join(folder, 'mariadb') });
const mail = await startMaildev({ folder: join(folder, 'mail') });
try {
	await measureStatistics(print);
	await measureTable(print);
	await measureCoverage(print);
	await measureArticle(print);
	await measureEditor(server, mail, folder, print);
	await measurePages(server, mail, folder, print);
	await measureLive(server, mail, folder, print);
	await measureJobs(server, mail, folder, print);
} finally {
	await Promise.all([server.stop(), mail.stop()]);
	rmSync(folder, { recursive: true, force: true });
}
process.exit(missed === 0 ? 0 : 1);
