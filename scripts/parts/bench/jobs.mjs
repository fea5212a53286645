// Mails through the outbox by two processes on one database: each once. The control is the same queue without row
// locks, which shows that this load does find two workers at the same row.
import { createConnection } from 'mysql2/promise';
import { createTransport } from 'nodemailer';
import { insertRows, nextId, upTo } from '../fill/insert.mjs';
import { createDatabase, pause } from '../mariadb.mjs';
import { startApp } from './app.mjs';

const mails = 400;
const patienceMs = 120_000;

/** @param {string} mailPage @returns {Promise<{ subject: string }[]>} */
const received = async (mailPage) => (await fetch(`${mailPage}/api/email`)).json();

/** @param {import('mysql2/promise').Connection} connection */
async function postMails(connection) {
	const id = await nextId(connection, 'mail');
	const now = new Date();
	await insertRows(
		connection,
		'mail',
		upTo(mails).map((n) => ({
			id: id + n,
			message_id: `bench-${n}@calipress`,
			recipient: 'reader@northlight.example',
			subject: `Bench ${n}`,
			text_body: 'Words.',
			html_body: '<p>Words.</p>',
			created_at: now
		}))
	);
	await insertRows(
		connection,
		'job',
		upTo(mails).map((n) => ({
			kind: 'send-mail',
			payload: JSON.stringify({ mailId: id + n }),
			run_at: now,
			created_at: now
		}))
	);
}

/** How many of as many rows two workers take twice when they read, then mark, without a lock. @param {string} database */
async function takenTwiceWithoutLocks(database) {
	const workers = await Promise.all([0, 1].map(() => createConnection({ uri: database })));
	await workers[0]?.query(
		'create table bench_naive (id int primary key, done int not null default 0, index (done))'
	);
	if (workers[0])
		await insertRows(
			workers[0],
			'bench_naive',
			upTo(mails).map((id) => ({ id }))
		);
	/** @type {number[]} */
	const taken = [];
	await Promise.all(
		workers.map(async (worker) => {
			for (;;) {
				const [rows] = await worker.query('select id from bench_naive where done = 0 order by id limit 8');
				const ids = /** @type {{ id: number }[]} */ (rows).map((row) => row.id);
				if (ids.length === 0) return;
				taken.push(...ids);
				await worker.query('update bench_naive set done = 1 where id in (?)', [ids]);
			}
		})
	);
	await Promise.all(workers.map((worker) => worker.end()));
	return taken.length - new Set(taken).size;
}

/** Mails in a second by the mail library alone, over kept connections. @param {string} smtpUrl */
async function bareMailsPerS(smtpUrl) {
	const transport = createTransport({ url: smtpUrl, pool: true });
	const began = Date.now();
	await Promise.all(
		upTo(mails).map((n) =>
			transport.sendMail({
				from: 'desk@northlight.example',
				to: 'reader@northlight.example',
				subject: `Bare ${n}`,
				text: 'Words.'
			})
		)
	);
	transport.close();
	return mails / ((Date.now() - began) / 1000);
}

/**
 * @param {{ url: string }} server @param {{ smtpUrl: string, webUrl: string }} mail @param {string} folder
 * @param {(figure: import('./figure.mjs').Figure) => void} print
 */
export async function measureJobs(server, mail, folder, print) {
	const database = await createDatabase(server.url, 'bench_jobs');
	const apps = await Promise.all(
		[0, 1].map(() => startApp({ database, smtp: mail.smtpUrl, folder, jobs: 'on' }))
	);
	const connection = await createConnection({ uri: database, timezone: 'Z' });
	const began = Date.now();
	try {
		await postMails(connection);
		for (let left = mails; left > 0; await pause(100)) {
			const [rows] = await connection.query(
				"select count(*) as n from job where kind = 'send-mail' and state = 'waiting'"
			);
			left = Number(/** @type {{ n: number }[]} */ (rows)[0]?.n);
			if (Date.now() - began > patienceMs) throw new Error(`${left} mails were not sent in time`);
		}
		const tookS = (Date.now() - began) / 1000;
		const subjects = (await received(mail.webUrl))
			.map(({ subject }) => subject)
			.filter((subject) => subject.startsWith('Bench '));
		const distinct = new Set(subjects).size;
		print({
			name: 'jobs.done',
			value: distinct,
			control: mails,
			goal: 'ratio=1',
			met: distinct === mails
		});
		const twice = subjects.length - distinct;
		print({
			name: 'jobs.done-twice',
			value: twice,
			control: await takenTwiceWithoutLocks(database),
			goal: '=0',
			met: twice === 0
		});
		const bare = await bareMailsPerS(mail.smtpUrl);
		print({
			name: 'jobs.mails-per-s',
			value: mails / tookS,
			control: bare,
			goal: '>10',
			met: mails / tookS > 10
		});
	} finally {
		await connection.end();
		await Promise.all(apps.map((app) => app.stop()));
	}
}
