import { spawn } from 'node:child_process';
import { createServer } from 'node:net';

/** A free port on loopback. */
export const freePort = () =>
	new Promise<number>((done, fail) => {
		const server = createServer();
		server.once('error', fail);
		server.listen(0, '127.0.0.1', () => {
			const address = server.address();
			server.close(() =>
				address !== null && typeof address === 'object' ? done(address.port) : fail(new Error('no port'))
			);
		});
	});

/** Runs one of our scripts; `said` settles when a line of it matches. */
export function startScript(script: string, args: string[], env: Record<string, string | undefined>) {
	const child = spawn(process.execPath, [`scripts/${script}`, ...args], {
		stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
		env: { ...process.env, LOG_LEVEL: 'error', ...env }
	});
	let words = '';
	const listeners = new Set<() => void>();
	for (const stream of [child.stdout, child.stderr])
		stream?.on('data', (chunk: Buffer) => {
			words += chunk.toString();
			for (const look of listeners) look();
		});
	const ended = new Promise<number | null>((done) => child.once('exit', (code) => done(code)));
	const said = (pattern: RegExp) =>
		new Promise<string>((done, fail) => {
			const look = () => {
				const found = pattern.exec(words)?.[0];
				if (found === undefined) return;
				listeners.delete(look);
				done(found);
			};
			listeners.add(look);
			look();
			void ended.then((code) => fail(new Error(`${script} ended with ${code}: ${words}`)));
		});
	const listening = () => new Promise<void>((done) => child.once('message', () => done()));
	const kill = (signal: NodeJS.Signals) => child.kill(signal);
	return { said, listening, ended, kill, words: () => words };
}
