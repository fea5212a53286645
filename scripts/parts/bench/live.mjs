// A board of 20 × 40 cells that ten testers fill at once while each of them watches it: how soon an entry is
// acknowledged, how soon the others are told, and what the board itself takes, followed or opened. The control is one tester alone.
import { randomBytes, randomUUID } from 'node:crypto';
import { createConnection } from 'mysql2/promise';
import { insertRows, nextId, upTo } from '../fill/insert.mjs';
import { createDatabase, pause } from '../mariadb.mjs';
import { signedIn, startApp } from './app.mjs';

const rows = 20;
const columns = 40;
const testers = 10;
const entriesEach = 60;
/** Five readings a second from each, several times what a person types. */
const betweenMs = 200;
/** As the page does: what happened is gathered before the board is read anew, longer where that took long. */
const gatherMs = 250;
const restTimes = 4;
const openMs = 1000;
const goalMs = 100;

/** @param {number[]} values @param {number} q */
const quantile = (values, q) => {
	const sorted = [...values].sort((a, b) => a - b);
	return sorted[Math.min(sorted.length - 1, Math.ceil(q * sorted.length) - 1)] ?? NaN;
};

/** A campaign with four of five readings in each cell. @param {string} database */
async function fillBoard(database) {
	const connection = await createConnection({ uri: database, timezone: 'Z' });
	const now = new Date();
	const people = upTo(testers).map((n) => ({
		id: randomUUID(),
		name: `Tester ${n}`,
		email: `tester-${n}@northlight.example`,
		created_at: now
	}));
	await insertRows(connection, 'user', people);
	await insertRows(
		connection,
		'user_role',
		people.map(({ id }) => ({ user_id: id, role: 'tester' }))
	);
	const by = people[0]?.id;
	await insertRows(connection, 'rig', [{ id: 1, slug: 'live-rig', name: 'Live rig', created_at: now }]);
	await insertRows(connection, 'rig_revision', [
		{ id: 1, rig_id: 1, number: 1, change: '', created_by: by, created_at: now }
	]);
	const profiles = upTo(rows).map((n) => ({
		id: n + 1,
		rig_id: 1,
		slug: `profile-${n}`,
		name: `Profile ${n}`,
		parent_id: n === 0 ? null : 1,
		notes: '',
		created_at: now
	}));
	await insertRows(connection, 'profile', profiles);
	await insertRows(
		connection,
		'workload',
		upTo(columns).map((n) => ({
			id: n + 1,
			slug: `workload-${n}`,
			name: `Workload ${n}`,
			settings: '',
			quantity: 'time',
			unit: 's',
			better: 'lower',
			class: 'all-core',
			repeats: 5,
			least_difference_percent: 1,
			created_at: now
		}))
	);
	await insertRows(connection, 'campaign', [
		{ id: 1, slug: 'live', name: 'Live', rig_revision_id: 1, purpose: '', created_by: by, created_at: now }
	]);
	await insertRows(
		connection,
		'campaign_profile',
		upTo(rows).map((n) => ({ campaign_id: 1, profile_id: n + 1, position: n }))
	);
	await insertRows(
		connection,
		'campaign_workload',
		upTo(columns).map((n) => ({ campaign_id: 1, workload_id: n + 1, position: n, repeats: 5 }))
	);
	const run = await nextId(connection, 'run');
	const cells = upTo(rows * columns);
	await insertRows(
		connection,
		'run',
		cells.map((n) => ({
			id: run + n,
			campaign_id: 1,
			profile_id: (n % rows) + 1,
			workload_id: Math.floor(n / rows) + 1,
			tester_id: by,
			source: 'api',
			started_at: now,
			notes: '',
			created_at: now
		}))
	);
	await insertRows(
		connection,
		'reading',
		cells.flatMap((n) =>
			upTo(4).map((k) => ({
				run_id: run + n,
				position: k + 1,
				value: 100 + (n % 7) + k / 10,
				created_at: now
			}))
		)
	);
	await connection.end();
	return people;
}

/**
 * @param {{ url: string }} server @param {{ smtpUrl: string }} mail @param {string} folder
 * @param {(figure: import('./figure.mjs').Figure) => void} print
 */
export async function measureLive(server, mail, folder, print) {
	const database = await createDatabase(server.url, 'bench_live');
	const app = await startApp({ database, smtp: mail.smtpUrl, folder });
	const people = await fillBoard(database);
	const cookies = await Promise.all(people.map(({ id }) => signedIn(database, id)));
	const address = `${app.origin}/bench/campaigns/live`;
	/** When a reading was acknowledged, by its cell. @type {Map<string, number>} */
	const acknowledged = new Map();
	/** @type {number[]} */
	const boards = [];
	/** @type {number[]} */
	const toldAfter = [];
	/** Boards that could not be brought up to date and were read whole. */
	let anew = 0;

	const cell = 'profile=profile-0&workload=workload-0';
	const readBoard = /** @param {string} cookie */ async (cookie) => {
		const began = performance.now();
		const answer = await fetch(`${address}/__data.json?${cell}`, { headers: { cookie } });
		await answer.arrayBuffer();
		return answer.status === 200 ? performance.now() - began : NaN;
	};

	/** The board's tag, as the page finds it in its data. @param {string} text */
	const tagIn = (text) => {
		const { data } = JSON.parse(text).nodes.at(-1);
		return /** @type {string} */ (data[data[data[0].board].tag]);
	};
	/** Watches as the page does: asks what changed on the board when somebody changed it. @param {string} cookie */
	const watch = (cookie) => {
		let tag = '';
		const askNews = async () => {
			const began = performance.now();
			const answer = await fetch(`${address}/news?${cell}&tag=${tag}`, { headers: { cookie } });
			const news = JSON.parse(await answer.text());
			if (news.kind === 'changed') tag = news.tag;
			else {
				anew += 1;
				const whole = await fetch(`${address}/__data.json?${cell}`, { headers: { cookie } });
				tag = tagIn(await whole.text());
			}
			return performance.now() - began;
		};
		const leave = new AbortController();
		/** @type {Promise<unknown>} */
		let line = Promise.resolve();
		/** @type {NodeJS.Timeout | undefined} */
		let timer;
		let tookMs = 0;
		const changed = () => {
			timer ??= setTimeout(
				() => {
					timer = undefined;
					line = line.then(askNews).then((ms) => {
						tookMs = ms;
						boards.push(ms);
					});
				},
				Math.max(gatherMs, restTimes * tookMs || 0)
			);
		};
		const listen = async () => {
			const answer = await fetch(`${address}/events`, { headers: { cookie }, signal: leave.signal });
			let text = '';
			for await (const chunk of answer.body ?? []) {
				text += Buffer.from(chunk).toString();
				const parts = text.split('\n\n');
				text = parts.pop() ?? '';
				for (const part of parts) {
					const data = /^data: (.*)$/m.exec(part)?.[1];
					if (!data) continue;
					changed();
					for (const { cell } of /** @type {{ cell: string }[]} */ (JSON.parse(data))) {
						const at = acknowledged.get(cell);
						// Told before its own answer arrived: at once.
						toldAfter.push(at === undefined ? 0 : performance.now() - at);
					}
				}
			}
		};
		const ended = listen().catch(() => undefined);
		return async () => {
			leave.abort();
			clearTimeout(timer);
			await ended;
			await line;
		};
	};

	/** Enters a reading into cell after cell of some rows. @param {number} who @param {number} n */
	const enter = async (who, n) => {
		const profile = `profile-${(who * 2 + Math.floor(n / columns)) % rows}`;
		const workload = `workload-${n % columns}`;
		const began = performance.now();
		const answer = await fetch(`${address}/readings`, {
			method: 'POST',
			headers: { cookie: cookies[who] ?? '', 'content-type': 'application/json', origin: app.origin },
			body: JSON.stringify({
				profile,
				workload,
				unit: 's',
				runKey: randomBytes(16).toString('hex'),
				ambientC: null,
				startedAt: null,
				started: '',
				notes: '',
				othersSeen: 4,
				readings: [{ key: randomBytes(16).toString('hex'), value: 100 + n / 10 }]
			})
		});
		await answer.arrayBuffer();
		acknowledged.set(`${profile}/${workload}`, performance.now());
		return answer.status === 200 ? performance.now() - began : NaN;
	};

	try {
		for (let n = 0; n < 10; n++) await readBoard(cookies[0] ?? '');
		const alone = await enter(0, 0);
		/** @type {number[]} */
		const quiet = [];
		for (let n = 1; n < 20; n++) quiet.push(await enter(0, n));
		const still = [];
		for (let n = 0; n < 15; n++) still.push(await readBoard(cookies[0] ?? ''));

		const watches = cookies.map(watch);
		await pause(300);
		/** Somebody opens the board, again and again, while the others fill it. @type {number[]} */
		const opened = [];
		let filling = true;
		const opening = (async () => {
			while (filling) {
				opened.push(await readBoard(cookies[0] ?? ''));
				await pause(openMs);
			}
		})();
		const took = (
			await Promise.all(
				upTo(testers).map(async (who) => {
					await pause((betweenMs / testers) * who);
					/** @type {number[]} */
					const times = [];
					for (let n = 0; n < entriesEach; n++) {
						const ms = await enter(who, 20 + n);
						times.push(ms);
						await pause(Math.max(0, betweenMs - (Number.isFinite(ms) ? ms : 0)));
					}
					return times;
				})
			)
		).flat();
		filling = false;
		await opening;
		await pause(1500);
		await Promise.all(watches.map((leave) => leave()));

		const p99 = took.some(Number.isNaN) ? NaN : quantile(took, 0.99);
		const control = quantile([...quiet, alone], 0.99);
		print({ name: 'live.entry.p99.ms', value: p99, control, goal: `<${goalMs}`, met: p99 < goalMs });
		const board = quantile(boards, 0.5);
		print({
			name: 'live.board.ms',
			value: board,
			control: quantile(still, 0.5),
			goal: '<500',
			met: board < 500
		});
		const open = opened.some(Number.isNaN) ? NaN : quantile(opened, 0.5);
		print({
			name: 'live.open.ms',
			value: open,
			control: quantile(still, 0.5),
			goal: '<500',
			met: open < 500
		});
		// The first of each watcher, and no more: the others were told by what changed.
		print({ name: 'live.anew', value: anew, control: testers, goal: 'ratio<=1', met: anew <= testers });
		const told = quantile(toldAfter, 0.99);
		print({ name: 'live.told.p99.ms', value: told, control: 500, goal: '<1500', met: told < 1500 });
		const wanted = testers * entriesEach * testers;
		print({
			name: 'live.told',
			value: toldAfter.length,
			control: wanted,
			goal: 'ratio=1',
			met: toldAfter.length === wanted
		});
	} finally {
		await app.stop();
	}
}
