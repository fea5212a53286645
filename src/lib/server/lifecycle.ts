import { openMailer } from './jobs/mailer';
import { startRunner, type Runner } from './jobs/runner';
import { database } from './app';
import { env } from './env';
import { endWatches } from './live/campaign-hub';
import { log } from './log';

interface Life {
	runner?: Runner;
	mailer?: ReturnType<typeof openMailer>;
	/** Set while the process ends: no new visitors, those inside are served. */
	draining: boolean;
}

// One life for the process, also where development loads this module again.
const kept = globalThis as typeof globalThis & { calipressLife?: Life };
export const life: Life = (kept.calipressLife ??= { draining: false });

/** The mail server's connections of this process. */
export const mailer = () => (life.mailer ??= openMailer(env().SMTP_URL, env().MAIL_FROM));

/** Starts the background work of this process, once, and ends it when the process is asked to end. */
export function startWork(): void {
	if (life.runner) return;
	if (env().JOBS === 'on')
		life.runner = startRunner({ db: database().db, origin: env().ORIGIN.replace(/\/$/, '') }, mailer());
	// The server script tells: first to take no more visitors, then, when the last is served, to close.
	process.once('calipress:drain', () => {
		life.draining = true;
		// A watched board would keep its connection open for as long as it is looked at.
		void endWatches();
	});
	process.once('calipress:close', (done: () => void) => {
		void endWork().finally(done);
	});
}

async function endWork(): Promise<void> {
	try {
		await life.runner?.stop();
		life.mailer?.close();
		await database().pool.end();
	} catch (error) {
		log.error({ error: String(error) }, 'the end was not clean');
	}
}
