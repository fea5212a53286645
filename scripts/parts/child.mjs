import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { program } from './packages.mjs';

/**
 * Starts a service that must not outlive this process, not even when this process is killed: the kernel ends it then,
 * where Debian's setpriv is there to ask for that. It has a group of its own, so that a Ctrl-C meant for us does not
 * end it before the application has finished.
 * @param {string} command @param {string[]} args
 */
export function startService(command, args) {
	const setpriv = program('setpriv');
	return setpriv
		? spawn(setpriv, ['--pdeathsig', 'TERM', '--', command, ...args], { stdio: 'ignore', detached: true })
		: spawn(command, args, { stdio: 'ignore', detached: true });
}

/** The command line of a process, or null when it is gone. @param {number} pid */
export function commandOf(pid) {
	try {
		return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
	} catch {
		return null;
	}
}
