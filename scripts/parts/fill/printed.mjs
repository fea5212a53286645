// What a publication has written: articles at every stage with revisions and comments; the printed ones with an edition.
import { createHash } from 'node:crypto';
import { insertRows, nextId, upTo } from './insert.mjs';

const stages = ['published', 'drafting', 'published', 'in-review', 'published', 'changes-asked'];
const hourMs = 3_600_000;
const paragraph =
	'<p>At stock the sieve takes its time, and each step after it takes a little less of it, which the plate shows with its whiskers.</p>';
const source = `${'Each step takes a little less time than the one before it. '.repeat(60)}\n`;

/**
 * @param {import('mysql2/promise').Connection} connection
 * @param {Awaited<ReturnType<typeof import('./lab.mjs').fillLab>>} lab
 * @param {{ articles: number, campaign: number, campaigns: number, tag: string, now: Date }} options
 */
export async function fillPrinted(connection, lab, { articles, campaign, campaigns, tag, now }) {
	const author = lab.person(1);
	const editor = lab.person(2);
	const article = await nextId(connection, 'article');
	const revision = await nextId(connection, 'revision');
	const edition = await nextId(connection, 'edition');
	const stageOf = /** @param {number} i */ (i) => stages[i % stages.length];
	const at = /** @param {number} i */ (i) => new Date(now.getTime() - (i + 1) * hourMs);
	const title = /** @param {number} i */ (i) => `Article ${tag} ${i}`;
	const printed = upTo(articles).filter((i) => stageOf(i) === 'published');

	await insertRows(
		connection,
		'article',
		upTo(articles).map((i) => ({
			id: article + i,
			slug: `${tag}-article-${i}`,
			title: title(i),
			standfirst: 'Four ways to spend sixteen cores.',
			template: 'tuning-guide',
			// An edition names its article and a published article its edition: it is published below.
			stage: stageOf(i) === 'published' ? 'drafting' : stageOf(i),
			author_id: author,
			head: 1,
			created_at: at(i),
			updated_at: at(i)
		}))
	);
	await insertRows(
		connection,
		'article_campaign',
		upTo(articles).map((i) => ({
			article_id: article + i,
			campaign_id: campaign + (i % campaigns),
			position: 0
		}))
	);
	await insertRows(
		connection,
		'revision',
		upTo(articles).map((i) => ({
			id: revision + i,
			article_id: article + i,
			number: 1,
			title: title(i),
			standfirst: '',
			source,
			saved_by: author,
			saved_at: at(i)
		}))
	);
	await insertRows(
		connection,
		'comment',
		upTo(articles * 2).map((i) => ({
			article_id: article + (i % articles),
			revision_number: 1,
			quote: '',
			body: 'Say what the reader should do with this.',
			blocking: i % 3 === 0,
			author_id: editor,
			created_at: now
		}))
	);
	await insertRows(
		connection,
		'edition',
		printed.map((i, n) => ({
			id: edition + n,
			article_id: article + i,
			number: 1,
			revision_id: revision + i,
			title: title(i),
			standfirst: 'Four ways to spend sixteen cores.',
			source,
			data: '{"campaigns":[]}',
			page: paragraph.repeat(60),
			plain: source,
			author_name: 'Ines Calloway',
			tester_names: JSON.stringify(['Tomas Reyl']),
			hash: createHash('sha256').update(`${tag}${i}`).digest('hex'),
			approved_by: editor,
			approved_at: at(i),
			published_at: at(i)
		}))
	);
	await insertRows(
		connection,
		'edition_part',
		printed.map((_, n) => ({ edition_id: edition + n, part_id: lab.part + n }))
	);
	const mean = 31.2;
	const summary = {
		n: 10,
		mean,
		median: mean,
		min: 31,
		max: 31.4,
		sd: 0.1,
		cvPercent: 0.32,
		ci95: [31.1, 31.3],
		flagged: [],
		headline: mean
	};
	await insertRows(
		connection,
		'edition_result',
		printed.flatMap((i, n) =>
			upTo(20).map((cell) => ({
				edition_id: edition + n,
				campaign_slug: `${tag}-campaign-${i % campaigns}`,
				rig_name: `Rig ${tag}`,
				rig_revision: 1,
				profile_slug: cell % 5 === 0 ? 'stock' : `step-${cell % 5}`,
				profile_name: cell % 5 === 0 ? 'Stock' : `Step ${cell % 5}`,
				workload_slug: `${tag}-workload-${(n + Math.floor(cell / 5)) % lab.workloads}`,
				workload_name: `Workload ${tag} ${(n + Math.floor(cell / 5)) % lab.workloads}`,
				unit: 's',
				better: 'lower',
				figures: JSON.stringify({ summary, comparison: null, over: 'stock' })
			}))
		)
	);
	await insertRows(
		connection,
		'correction',
		printed.map((i, n) => ({
			article_id: article + i,
			edition_id: edition + n,
			kind: 'clarification',
			body: 'The unit was missing in the third table.',
			made_by: editor,
			made_at: at(i)
		}))
	);
	await connection.query(
		`update article join edition on edition.article_id = article.id
		 set article.stage = 'published', article.live_edition_id = edition.id, article.first_published_at = edition.published_at
		 where edition.id >= ?`,
		[edition]
	);
}
