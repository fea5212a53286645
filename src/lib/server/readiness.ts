import { database } from './app';
import { clock } from './clock';
import { env } from './env';
import { life, mailer } from './lifecycle';

const lookMs = 30_000;

/** Each thing the application needs, and whether it answers. */
export async function readiness() {
	const [databaseAnswers, mailAnswers] = await Promise.all([
		database()
			.pool.query('select 1')
			.then(() => true)
			.catch(() => false),
		mailer().verify()
	]);
	const last = life.runner?.lastLook();
	const jobsRun =
		env().JOBS === 'off' ||
		(last !== undefined && last !== null && clock.now().getTime() - last.getTime() < lookMs);
	return {
		ready: databaseAnswers && mailAnswers && jobsRun && !life.draining,
		database: databaseAnswers,
		mail: mailAnswers,
		jobs: jobsRun,
		draining: life.draining
	};
}
