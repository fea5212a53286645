import pino from 'pino';

/** Structured logs. Secrets are cut out by name wherever they stand. */
export const log = pino({
	level: process.env.LOG_LEVEL || 'info',
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
