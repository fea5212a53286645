// What a lab has measured: campaigns, runs with their readings, signatures, and the log of it.
import { insertRows, nextId, scatter, upTo } from './insert.mjs';

const workloadsOfCampaign = 10;
const minuteMs = 60_000;

/**
 * @param {import('mysql2/promise').Connection} connection
 * @param {Awaited<ReturnType<typeof import('./lab.mjs').fillLab>>} lab
 * @param {{ campaigns: number, runs: number, readings: number, tag: string, now: Date }} options how many in all
 */
export async function fillMeasured(connection, lab, { campaigns, runs, readings, tag, now }) {
	const campaign = await nextId(connection, 'campaign');
	const rigOf = /** @param {number} c */ (c) => c % lab.rigs;
	const profileOf = /** @param {number} c @param {number} p */ (c, p) =>
		lab.profile + rigOf(c) * lab.profilesOfRig + p;
	const workloadOf = /** @param {number} c @param {number} w */ (c, w) =>
		lab.workload + ((c + w) % lab.workloads);
	const tester = lab.person(0);

	await insertRows(
		connection,
		'campaign',
		upTo(campaigns).map((c) => ({
			id: campaign + c,
			slug: `${tag}-campaign-${c}`,
			name: `Campaign ${tag} ${c}`,
			rig_revision_id: lab.revision + rigOf(c),
			purpose: 'How far each step carries.',
			created_by: tester,
			created_at: new Date(now.getTime() - c * 60 * minuteMs)
		}))
	);
	await insertRows(
		connection,
		'campaign_profile',
		upTo(campaigns * lab.profilesOfRig).map((i) => {
			const c = Math.floor(i / lab.profilesOfRig);
			const p = i % lab.profilesOfRig;
			return { campaign_id: campaign + c, profile_id: profileOf(c, p), position: p };
		})
	);
	await insertRows(
		connection,
		'campaign_workload',
		upTo(campaigns * workloadsOfCampaign).map((i) => {
			const c = Math.floor(i / workloadsOfCampaign);
			const w = i % workloadsOfCampaign;
			return { campaign_id: campaign + c, workload_id: workloadOf(c, w), position: w, repeats: 10 };
		})
	);

	const cells = lab.profilesOfRig * workloadsOfCampaign;
	/** The n-th run goes to a campaign in turn, and there to the next cell. @param {number} n */
	const placeOf = (n) => {
		const c = n % campaigns;
		const cell = Math.floor(n / campaigns) % cells;
		return { c, p: cell % lab.profilesOfRig, w: Math.floor(cell / lab.profilesOfRig) };
	};
	const run = await nextId(connection, 'run');
	await insertRows(
		connection,
		'run',
		upTo(runs).map((n) => {
			const { c, p, w } = placeOf(n);
			const at = new Date(now.getTime() - (runs - n) * minuteMs);
			return {
				id: run + n,
				campaign_id: campaign + c,
				profile_id: profileOf(c, p),
				workload_id: workloadOf(c, w),
				tester_id: lab.people[(n % Math.ceil(lab.people.length / 5)) * 5]?.id ?? tester,
				source: 'api',
				started_at: at,
				ambient_c: 21.4,
				notes: '',
				created_at: at
			};
		})
	);
	const noise = scatter(7);
	await insertRows(
		connection,
		'reading',
		upTo(readings).map((n) => {
			const { c, p, w } = placeOf(n % runs);
			const base = 20 + ((c * 13 + w * 29) % 200);
			return {
				run_id: run + (n % runs),
				position: Math.floor(n / runs),
				value: base * (1 - 0.01 * p) * (1 + 0.006 * noise()),
				created_at: now
			};
		})
	);
	await insertRows(
		connection,
		'cell_signature',
		upTo(Math.min(campaigns * 5, runs)).map((n) => {
			const { c, p, w } = placeOf(n);
			return {
				campaign_id: campaign + c,
				profile_id: profileOf(c, p),
				workload_id: workloadOf(c, w),
				signed_by: tester,
				signed_at: now
			};
		})
	);
	await insertRows(
		connection,
		'audit_event',
		upTo(runs).map((n) => ({
			at: new Date(now.getTime() - (runs - n) * minuteMs),
			actor_id: tester,
			act: 'run.record',
			subject_kind: 'run',
			subject_id: String(run + n),
			before: null,
			after: JSON.stringify({ readings: Math.round(readings / runs) })
		}))
	);
	return { campaign };
}
