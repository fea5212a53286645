import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import { slugOf } from '../../../domain/shared/slug';
import {
	articleStart,
	changesAsk,
	correctionInput,
	plainMove,
	revisionSave,
	slotChoice,
	withdrawal
} from '../../../schemas/article';
import type { Context } from '../../context';
import * as articles from '../../db/queries/article';
import { approveArticle } from '../../services/articles/approve-article';
import { askChanges } from '../../services/articles/ask-changes';
import { commentOnArticle, resolveComment } from '../../services/articles/comment-on-article';
import { correctArticle } from '../../services/articles/correct-article';
import { publishArticle, publishDue } from '../../services/articles/publish-article';
import { reviseArticle } from '../../services/articles/revise-article';
import { saveRevision } from '../../services/articles/save-revision';
import { planSlot, scheduleArticle } from '../../services/articles/schedule-article';
import { startArticle } from '../../services/articles/start-article';
import { submitArticle } from '../../services/articles/submit-article';
import { withdrawArticle } from '../../services/articles/withdraw-article';
import { kept, type Act, type World } from '../act';
import type { Who } from '../staff';

// The prose stands in files of its own, read when the application is built.
const files = import.meta.glob<string>('./*.md', { query: '?raw', import: 'default', eager: true });

/** The text of an article of the demo. RangeError for one that is not there. */
export function prose(name: string): string {
	const text = files[`./${name}.md`];
	if (text === undefined) throw new RangeError(`The demo has no text ${name}.`);
	return text;
}

interface Comment {
	/** How the demo calls it. */
	name: string;
	who: Who;
	quote?: string;
	body: string;
	blocking?: boolean;
	/** The comment it answers, as the demo calls it. */
	answers?: string;
}

interface Head {
	title: string;
	standfirst: string;
	template: string;
	campaigns: string[];
	author: Who;
}

type When = [day: number, time: string];

/** The acts of one article's life, each at its time. */
export class Story {
	readonly acts: Act[] = [];
	private readonly slug: string;

	constructor(
		private readonly world: World,
		private readonly head: Head
	) {
		this.slug = slugOf(head.title);
	}

	/** Adds an act by somebody at a time; its work is given the article as it stands then. */
	private act(
		when: When,
		who: Who,
		what: string,
		run: (ctx: Context, article: articles.ArticleRow) => Promise<Outcome<unknown>>
	): this {
		this.acts.push({
			at: this.world.calendar.at(...when),
			who,
			what: `${what} of ${this.slug}`,
			run: async (ctx) => {
				const found = await articles.bySlug(ctx.db, this.slug);
				if (!found) throw new Error(`There is no article ${this.slug} yet.`);
				return run(ctx, found.article);
			}
		});
		return this;
	}

	start(day: number, time: string): this {
		const { title, template, campaigns, author } = this.head;
		this.acts.push({
			at: this.world.calendar.at(day, time),
			who: author,
			what: `start of ${this.slug}`,
			run: (ctx) => startArticle(ctx, articleStart.parse({ title, template, campaigns }))
		});
		return this;
	}

	save(when: When, source: string, note = ''): this {
		const { title, standfirst, author } = this.head;
		return this.act(when, author, 'text', (ctx, { head }) =>
			saveRevision(ctx, this.slug, revisionSave.parse({ title, standfirst, source, basedOn: head }), note)
		);
	}

	submit(...when: When): this {
		return this.act(when, this.head.author, 'submission', (ctx, { version }) =>
			submitArticle(ctx, this.slug, plainMove.parse({ version }))
		);
	}

	comment(when: When, { name, who, quote = '', body, blocking = false, answers }: Comment): this {
		const { comments } = this.world;
		return this.act(when, who, 'comment', async (ctx) => {
			const parent = answers === undefined ? null : kept(comments, answers);
			const outcome = await commentOnArticle(ctx, this.slug, { quote, body, blocking, parent });
			if (outcome.ok) comments.set(name, outcome.value.id);
			return outcome;
		});
	}

	resolve(when: When, who: Who, name: string): this {
		return this.act(when, who, 'resolved comment', (ctx) =>
			resolveComment(ctx, this.slug, { comment: kept(this.world.comments, name), resolved: true })
		);
	}

	askChanges(when: When, words: string): this {
		return this.act(when, 'Marit', 'changes', (ctx, { version }) =>
			askChanges(ctx, this.slug, changesAsk.parse({ version, words }))
		);
	}

	plan(when: When, slot: When): this {
		return this.act(when, 'Marit', 'planned slot', (ctx, { version }) =>
			planSlot(ctx, this.slug, slotChoice.parse({ version, slot: this.world.calendar.local(...slot) }))
		);
	}

	approve(...when: When): this {
		return this.act(when, 'Marit', 'approval', (ctx, { version }) =>
			approveArticle(ctx, this.slug, plainMove.parse({ version }))
		);
	}

	schedule(when: When, slot: When): this {
		return this.act(when, 'Marit', 'slot', (ctx, { version }) =>
			scheduleArticle(ctx, this.slug, slotChoice.parse({ version, slot: this.world.calendar.local(...slot) }))
		);
	}

	publish(...when: When): this {
		return this.act(when, 'Marit', 'publication', (ctx, { version }) =>
			publishArticle(ctx, this.slug, plainMove.parse({ version }))
		);
	}

	/** The slot comes, and the schedule prints what is due. */
	slotComes(day: number, time: string): this {
		return this.act([day, time], 'Marit', 'slot', async ({ db, now, origin }, { id, approvedEditionId }) => {
			const job = { articleId: id, editionId: approvedEditionId ?? 0 };
			const outcome = await publishDue({ db, now, origin }, job);
			return outcome === 'published' ? done(outcome) : refuse('conflict', `The slot came: ${outcome}.`);
		});
	}

	revise(when: When, body: string): this {
		return this.act(when, 'Marit', 'new edition', (ctx, { version }) =>
			reviseArticle(ctx, this.slug, correctionInput.parse({ version, kind: 'correction', body }))
		);
	}

	clarify(when: When, body: string): this {
		return this.act(when, 'Marit', 'clarification', (ctx, { version }) =>
			correctArticle(ctx, this.slug, correctionInput.parse({ version, kind: 'clarification', body }))
		);
	}

	withdraw(when: When, reason: string): this {
		return this.act(when, 'Marit', 'withdrawal', (ctx, { version }) =>
			withdrawArticle(ctx, this.slug, withdrawal.parse({ version, reason }))
		);
	}
}
