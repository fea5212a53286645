/** Ends a script with one clear line. @param {string} line @returns {never} */
export function giveUp(line) {
	console.error(line);
	process.exit(1);
}

/** @param {string} line */
export const say = (line) => process.stdout.write(`${line}\n`);
