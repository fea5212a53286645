// The text that rendering is measured on: words and plates of a long guide, the same each time.

const sentences = [
	'The board spends a budget, and the clock comes down as more cores wake.',
	'We ran each test until the interval was narrow enough to say which of the two is faster.',
	'In a warm room the same setting costs more noise, and in a closed case it costs more heat.',
	'Write down what each setting says before you change it, because that is the way back.',
	'A clean night is what you would see from a machine that never fails, and also from one that fails once a week.',
	'What moved is the air, and the paste is the same paste.',
	'If wrong data would cost you more than time, take the lower clock and keep backups that you have tried to read.'
];

/** @param {number} at */
const sentence = (at) => sentences[at % sentences.length] ?? '';

/**
 * An article's source of about so many words and exactly so many plates, over the names of a campaign. Headings,
 * lists, tables, notes and bound numbers stand in it as they do in a guide.
 * @param {{ words?: number, plates?: number, profiles: string[], workloads: string[] }} options profiles with the baseline first
 */
export function longArticle({ words = 4000, plates = 30, profiles, workloads }) {
	const [baseline = '', ...tuned] = profiles;
	/** @template T @param {T[]} list @param {number} at */
	const turn = (list, at) => /** @type {T} */ (list[at % list.length]);
	const perPlate = Math.ceil(words / Math.max(1, plates));
	/** @type {string[]} */
	const blocks = [];
	for (let plate = 0; plate < plates; plate += 1) {
		const workload = turn(workloads, plate);
		const profile = turn(tuned, plate);
		if (plate % 5 === 0) blocks.push(`## Part ${plate / 5 + 1}: what it does`);
		blocks.push(`### ${plate + 1}. One more look`);
		/** @type {string[]} */
		let paragraph = [
			`It comes to :reading{workload=${workload} profile=${profile}}, which is **:gain{workload=${workload} profile=${profile} over=${baseline} show=words}** over stock.`
		];
		let count = 20;
		for (let at = plate; count < perPlate; at += 1) {
			paragraph.push(sentence(at));
			count += sentence(at).split(' ').length;
			if (paragraph.length === 4) {
				blocks.push(paragraph.join(' '));
				paragraph = [];
			}
		}
		if (paragraph.length > 0) blocks.push(paragraph.join(' '));
		if (plate % 6 === 1) blocks.push('- one thing at a time\n- then *test* it\n- then the next');
		if (plate % 6 === 3)
			blocks.push(
				'| Setting | Stock | Ours |\n| --- | ---: | ---: |\n| ratio | 44 | 49.5 |\n| limit | 142 | 180 |'
			);
		if (plate % 6 === 5)
			blocks.push(
				':::note{title="How sure are we?"}\nWhiskers are intervals, and the band is what makes no difference.\n:::'
			);
		blocks.push(
			plate % 2 === 0
				? `::plate{kind=scores workload=${workload} title="Scores, look ${plate + 1}"}`
				: `::plate{kind=gains over=${baseline} subject=${profile} title="Gains, look ${plate + 1}"}`
		);
	}
	return `${blocks.join('\n\n')}\n`;
}
