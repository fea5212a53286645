import pino from 'pino';

const level = process.env.LOG_LEVEL || 'info';

/** Structured logs. Secrets are cut out by name wherever they stand. */
export const log = pino({
	// A level that does not exist is named by env.ts, which stops the start.
	level: level in pino.levels.values || level === 'silent' ? level : 'info',
	base: undefined,
	timestamp: pino.stdTimeFunctions.isoTime,
	redact: {
		paths: [
			'password',
			'token',
			'authorization',
			'cookie',
			'*.password',
			'*.token',
			'*.authorization',
			'*.cookie',
			'headers["set-cookie"]'
		],
		censor: '[cut]'
	}
});
