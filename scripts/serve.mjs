// Serves the built application and ends calmly: readiness says no first, open connections are told to close,
// what is in flight is answered, then the jobs and the database are closed.
import { readFileSync } from 'node:fs';
import { createServer } from 'node:http';

const drainMs = Number(process.env.SHUTDOWN_TIMEOUT_MS || 20_000);
const noticeMs = Number(process.env.SHUTDOWN_NOTICE_MS || 0);
const host = process.env.HOST || '127.0.0.1';
const port = Number(process.env.PORT || 3000);
process.env.ORIGIN ||= `http://localhost:${port}`;
// The largest upload; each route has a limit of its own under it, and forms and JSON stay small (http/body-limit.ts).
process.env.BODY_SIZE_LIMIT ||= '64M';
if (Number(process.env.PROXY_DEPTH) > 0) {
	process.env.ADDRESS_HEADER ||= 'x-forwarded-for';
	process.env.XFF_DEPTH ||= process.env.PROXY_DEPTH;
}

// Files and early refusals are answered without the application's hooks; these are on them too.
const headers = Object.entries(
	JSON.parse(readFileSync(new URL('../src/lib/server/http/security-headers.json', import.meta.url), 'utf8'))
);
if (process.env.ORIGIN.startsWith('https:'))
	headers.push(['strict-transport-security', 'max-age=31536000; includeSubDomains']);

// The adapter reads this one before the application's own check of its environment, and in other words.
if (!/^https?:\/\//.test(process.env.ORIGIN) || !URL.canParse(process.env.ORIGIN)) {
	console.error('Calipress cannot start: ORIGIN is not a http: or https: address');
	process.exit(1);
}

let handler;
try {
	({ handler } = await import('../build/handler.js'));
} catch (error) {
	console.error(`Calipress cannot start: ${error instanceof Error ? error.message : error}`);
	process.exit(1);
}

const server = createServer((request, response) => {
	for (const [name, value] of headers) response.setHeader(name, value);
	if (draining) response.setHeader('connection', 'close');
	handler(request, response, () => {
		response.statusCode = 404;
		response.end();
	});
});
let draining = false;

/** Readiness says no at once; the port closes when whoever watches it had time to notice. */
function end() {
	if (draining) return;
	draining = true;
	process.emit('calipress:drain');
	setTimeout(closeServer, noticeMs);
}

function closeServer() {
	const close = () => process.emit('calipress:close', () => process.exit(0)) || process.exit(0);
	const patience = setTimeout(() => {
		server.closeAllConnections();
		close();
	}, drainMs);
	server.close(() => {
		clearTimeout(patience);
		close();
	});
	// A kept connection with nothing in flight would hold the server open.
	server.closeIdleConnections();
	setInterval(() => server.closeIdleConnections(), 200).unref();
}
// Whoever started this and listens to it was killed: nobody is left to say when to end.
process.on('disconnect', end);
process.on('SIGTERM', end);
process.on('SIGINT', end);

server.on('error', (error) => {
	const words = error.code === 'EADDRINUSE' ? `PORT ${port} is in use on ${host}` : error.message;
	console.error(`Calipress cannot start: ${words}`);
	process.exit(1);
});
server.listen(port, host, () => {
	if (process.send) process.send('listening');
});
