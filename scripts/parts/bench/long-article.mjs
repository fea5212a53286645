// An article as long as any that is written here: prose with bound figures, lists, tables, quotes, and plates. Made
// from the names that a campaign has, the same for the same names.
import { scatter, upTo } from '../fill/insert.mjs';

/** @typedef {{ workloads: string[], profiles: string[], baseline: string }} Names */

const subjects =
	'The board|A second run|Our rig|The fixed clock|This setting|The long render|A cooler room|The limit';
const verbs = 'holds|reaches|loses|keeps|shows|repeats|moves|settles at';
const objects =
	'the clock it was given|what the sieve takes back|a margin that nobody would feel|more heat than the fan can carry|the same order as before|its place in the table|less than a single core would|the current we wrote down';
const tails =
	'once the case is warm|after the third repeat|with the side panel on|in a room at rest|when every core works|as the maker says it should|before the limit is met|through the whole loop';

/** @param {string} words */
const parts = (words) => words.split('|');
const lists = [subjects, verbs, objects, tails].map(parts);

/** @param {string} text */
const countWords = (text) => (text.match(/[^\s]*[\p{L}\p{N}][^\s]*/gu) ?? []).length;

/**
 * @param {Names} names @param {{ words?: number, plates?: number }} size
 * @returns {string} Markdown with directives
 */
export function longArticle({ workloads, profiles, baseline }, { words = 4000, plates = 30 } = {}) {
	const noise = scatter(7);
	/** @template T @param {readonly T[]} items @returns {T} */
	const pick = (items) =>
		/** @type {T} */ (items[Math.floor(((noise() + 1) / 2) * items.length) % items.length]);
	const tuned = profiles.filter((name) => name !== baseline);
	const sentence = () => `${lists.map(pick).join(' ')}.`;
	const measured = () =>
		`${pick(lists[0] ?? [])} takes :reading{workload=${pick(workloads)} profile=${pick(profiles)}} there, *:gain{workload=${pick(workloads)} profile=${pick(tuned)}}* against stock, ${pick(lists[3] ?? [])}.`;
	const paragraph = () =>
		[sentence(), measured(), sentence(), `**${sentence()}**`, sentence(), sentence()].join(' ');
	const list = () =>
		upTo(4)
			.map(() => `- ${sentence()}`)
			.join('\n');
	const table = () =>
		['| Setting | Before | After |', '| --- | ---: | ---: |']
			.concat(upTo(5).map((n) => `| ${pick(lists[0] ?? [])} | ${n + 1}.${n} | ${n + 2}.${n} |`))
			.join('\n');
	/** @param {number} n */
	const plate = (n) =>
		n % 3 === 0
			? `::plate{kind=gains subject=${pick(tuned)} title="Gains, look ${n + 1}"}`
			: `::plate{kind=scores workload=${workloads[n % workloads.length]} subject=${pick(tuned)} title="Scores, look ${n + 1}"}`;

	/** @type {string[]} */
	const blocks = [];
	let drawn = 0;
	let written = 0;
	const add = /** @param {string} block */ (block) => {
		blocks.push(block);
		written += block.startsWith('::') ? 6 : countWords(block);
	};
	for (let n = 0; written < words || drawn < plates; n++) {
		if (n % 4 === 0) add(`## Part ${n / 4 + 1}: ${pick(lists[2] ?? [])}`);
		add(paragraph());
		if (n % 5 === 2) add(list());
		if (n % 7 === 3) add(table());
		if (n % 6 === 4) add(`> ${sentence()} ${sentence()}`);
		while (drawn < plates && drawn / plates <= written / words) add(plate(drawn++));
	}
	return `${blocks.join('\n\n')}\n`;
}
