// Server time and number of queries of each list, and of the campaign's pages: a full lab against a small one.
import { createConnection } from 'mysql2/promise';
import { fill, fullSize } from '../fill/fill.mjs';
import { createDatabase } from '../mariadb.mjs';
import { signedIn, startApp } from './app.mjs';

const goalMs = 100;
const warmUps = 5;
const repeats = 31;
/** Five of everything: the rows shown differ by five and more times, the work per campaign does not. */
const smallSize = { campaigns: 5, runs: 500, readings: 2500 };
const roleOrder = ['tester', 'writer', 'editor', 'liaison', 'admin'];

/** Each list, and the pages of one campaign, with the role that reads it. @param {string} tag @returns {[string, string, string?][]} */
const pages = (tag) => [
	['bench', '/bench', 'tester'],
	['campaign', `/bench/campaigns/${tag}-campaign-0`, 'tester'],
	['campaign-compare', `/bench/campaigns/${tag}-campaign-0/compare`, 'tester'],
	['campaign-history', `/bench/campaigns/${tag}-campaign-0/history`, 'tester'],
	['workloads', '/bench/workloads', 'tester'],
	['rigs', '/bench/rigs', 'tester'],
	['rig', `/bench/rigs/${tag}-rig-0`, 'tester'],
	['parts', '/stores', 'tester'],
	['samples', '/stores/samples', 'tester'],
	['part', `/stores/parts/${tag}-part-0`, 'tester'],
	['desk', '/desk', 'editor'],
	['editor', `/desk/articles/${tag}-article-1`, 'writer'],
	['review', `/desk/articles/${tag}-article-3/review`, 'editor'],
	['partners', '/partners', 'liaison'],
	['partner', `/partners/${tag}-partner-0`, 'liaison'],
	['people', '/people', 'admin'],
	['audit', '/people/audit', 'admin'],
	['home', '/'],
	['article', `/articles/${tag}-article-0`],
	['parts-published', '/parts'],
	['part-published', `/parts/${tag}-part-0`],
	['methods', '/methods'],
	['method', `/methods/${tag}-workload-0`],
	['corrections', '/corrections'],
	['feed', '/feed.atom'],
	['sitemap', '/sitemap.xml']
];

/** @param {number[]} values */
const median = (values) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;

/** @param {{ url: string }} server @param {{ smtpUrl: string }} mail @param {string} folder @param {string} name @param {typeof fullSize} size */
async function lab(server, mail, folder, name, size) {
	const database = await createDatabase(server.url, name);
	const app = await startApp({ database, smtp: mail.smtpUrl, folder });
	const { tag, people } = await fill(database, size);
	const cookies = await Promise.all(roleOrder.map((_, i) => signedIn(database, people[i]?.id ?? '')));
	const get = /** @param {string} path @param {string | undefined} role */ async (path, role) => {
		const cookie = role ? (cookies[roleOrder.indexOf(role)] ?? '') : '';
		const began = performance.now();
		const answer = await fetch(app.origin + path, { headers: { cookie }, redirect: 'manual' });
		await answer.arrayBuffer();
		// What is refused quickly is not a fast page.
		return answer.status === 200 ? performance.now() - began : NaN;
	};
	return { ...app, tag, get };
}

/**
 * @param {{ url: string }} server @param {{ smtpUrl: string }} mail @param {string} folder
 * @param {(figure: import('./figure.mjs').Figure) => void} print
 */
export async function measurePages(server, mail, folder, print) {
	const full = await lab(server, mail, folder, 'bench_full', fullSize);
	const small = await lab(server, mail, folder, 'bench_small', smallSize);
	const watch = await createConnection(server.url);
	const statements = async () => {
		const [rows] = await watch.query("show global status like 'Questions'");
		return Number(/** @type {{ Value: string }[]} */ (rows)[0]?.Value);
	};
	/** Statements of one request; our own look is one of them. @param {() => Promise<number>} request */
	const counted = async (request) => {
		const before = await statements();
		await request();
		return (await statements()) - before - 1;
	};
	try {
		const smallPages = pages(small.tag);
		for (const [i, [name, path, role]] of pages(full.tag).entries()) {
			const [, smallPath = ''] = smallPages[i] ?? [];
			const times = { full: /** @type {number[]} */ ([]), small: /** @type {number[]} */ ([]) };
			// In turns, so that whatever else the machine does falls on both.
			for (let n = 0; n < warmUps + repeats; n++) {
				const took = [await full.get(path, role), await small.get(smallPath, role)];
				if (n >= warmUps) {
					times.full.push(took[0] ?? NaN);
					times.small.push(took[1] ?? NaN);
				}
			}
			const value = median(times.full);
			print({
				name: `page.${name}.ms`,
				value,
				control: median(times.small),
				goal: `<${goalMs}`,
				met: value < goalMs
			});
			const queries = await counted(() => full.get(path, role));
			const queriesSmall = await counted(() => small.get(smallPath, role));
			print({
				name: `page.${name}.queries`,
				value: queries,
				control: queriesSmall,
				goal: 'ratio=1',
				met: queries === queriesSmall
			});
		}
	} finally {
		await watch.end();
		await Promise.all([full.stop(), small.stop()]);
	}
}
