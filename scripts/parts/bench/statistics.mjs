// All figures of 10,000 cells with ten readings each, as the campaign's page asks for them. The control is the
// statistics library alone, asked for mean, median and sample deviation of the same readings.
import { mean, median, sampleStandardDeviation } from 'simple-statistics';
import { scatter, upTo } from '../fill/insert.mjs';
import { withDomain } from './domain.mjs';

const campaigns = 200;
const profiles = 5;
const workloads = 10;
const readings = 10;
const rounds = 5;

/** @param {(round: number) => void} work the least of several times: what else ran is left out */
function leastMs(work) {
	return Math.min(
		...upTo(rounds).map((round) => {
			const began = performance.now();
			work(round);
			return performance.now() - began;
		})
	);
}

/** @param {number} c */
function campaignOf(c) {
	const noise = scatter(c);
	const profileSlugs = upTo(profiles).map((p) => (p === 0 ? 'stock' : `step-${p}`));
	const columns = upTo(workloads).map((w) => ({
		slug: `workload-${w}`,
		name: `Workload ${w}`,
		programVersion: '',
		settings: '',
		quantity: 'time',
		unit: 's',
		better: w % 2 ? 'higher' : 'lower',
		class: 'all-core',
		leastDifferencePercent: 1,
		headline: 'mean',
		needed: readings
	}));
	return {
		profiles: profileSlugs,
		workloads: columns,
		runs: profileSlugs.flatMap((profile, p) =>
			columns.map(({ slug }, w) => ({
				profile,
				workload: slug,
				tester: 'Tomas Reyl',
				startedAt: '2026-11-11T08:00:00.000Z',
				ambientC: 21.4,
				voided: false,
				readings: upTo(readings).map(() => ({
					value: (20 + w * 9) * (1 - 0.01 * p) * (1 + 0.006 * noise()),
					excluded: false
				}))
			}))
		),
		signatures: [],
		baseline: 'stock'
	};
}

/** @param {(figure: import('./figure.mjs').Figure) => void} print */
export const measureStatistics = (print) =>
	withDomain(async (load) => {
		const { summariseCampaign } = await load('campaign.ts');
		const all = upTo(campaigns).map(campaignOf);
		const value = leastMs(() => all.forEach((campaign) => summariseCampaign(campaign)));
		let sink = 0;
		const control = leastMs(() => {
			for (const { runs } of all)
				for (const run of runs) {
					const values = run.readings.map((reading) => reading.value);
					sink += mean(values) + median(values) + sampleStandardDeviation(values);
				}
		});
		if (!Number.isFinite(sink)) throw new Error('The control came to nothing.');
		const perCampaign = value / campaigns;
		print({
			name: 'statistics.campaign.ms',
			value: perCampaign,
			control: control / campaigns,
			goal: '<20',
			met: perCampaign < 20
		});
	});
