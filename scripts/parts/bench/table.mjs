// A whole table of comparisons, 12 profiles by 30 workloads by 10 readings, with Holm's correction over all of it: the
// median of many, on the server and in Debian's Chromium. The server's control is the statistics library alone, asked
// for mean and sample deviation of the same readings; the browser's is the server.
import { join } from 'node:path';
import { mean, sampleStandardDeviation } from 'simple-statistics';
import { scatter, upTo } from '../fill/insert.mjs';
import { inBrowser } from './browser.mjs';
import { compareTable, medianMs } from './comparison-table.mjs';
import { withDomain } from './domain.mjs';

const profiles = 12;
const workloads = 30;
const readings = 10;
const rounds = 61;
const goalMs = 30;

const path = /** @param {string} name */ (name) => JSON.stringify(join(process.cwd(), name));

/** The same function on an empty page. @param {number[][][]} cells */
const browserMs = (cells) =>
	inBrowser(
		`import { compareMany } from ${path('src/lib/domain/bench/statistics/compare-many.ts')};
		import { spread } from ${path('src/lib/domain/bench/statistics/sides.ts')};
		import { compareTable, medianMs } from ${path('scripts/parts/bench/comparison-table.mjs')};
		globalThis.run = (cells) => medianMs(() => compareTable({ compareMany, spread }, cells), ${rounds});`,
		cells
	);

/** @param {(figure: import('./figure.mjs').Figure) => void} print */
export const measureTable = (print) =>
	withDomain(async (load) => {
		const { compareMany } = await load('statistics/compare-many.ts');
		const { spread } = await load('statistics/sides.ts');
		const noise = scatter(1);
		const cells = upTo(profiles + 1).map((p) =>
			upTo(workloads).map((w) => upTo(readings).map(() => (20 + w) * (1 + 0.01 * p) * (1 + 0.01 * noise())))
		);
		const server = medianMs(() => compareTable({ compareMany, spread }, cells), rounds);
		const control = medianMs(
			() => cells.flat().map((values) => [mean(values), sampleStandardDeviation(values)]),
			rounds
		);
		const goal = `<${goalMs}`;
		print({ name: 'statistics.table.ms', value: server, control, goal, met: server < goalMs });
		const browser = await browserMs(cells);
		print({
			name: 'statistics.table.browser.ms',
			value: browser,
			control: server,
			goal,
			met: browser < goalMs
		});
	});
