import { describe, expect, it } from 'vitest';
import * as handover from './article-handover';
import type { HandoverFacts } from './article-handover';

const facts: HandoverFacts = {
	title: 'Brisk 360: quiet <at> what price',
	by: 'Marit Oake',
	author: 'Jonas Vell',
	reviewHref: 'https://desk.example/desk/articles/brisk-360/review',
	editHref: 'https://desk.example/desk/articles/brisk-360',
	publicHref: 'https://desk.example/articles/brisk-360',
	publication: 'Northlight Hardware'
};

const letters = {
	submitted: handover.submitted(facts, { again: false }),
	submittedAgain: handover.submitted(facts, { again: true }),
	changesAsked: handover.changesAsked(facts, 'Say <b>where</b> you measured.'),
	approved: handover.approved(facts, 2),
	approvalTakenOff: handover.approvalTakenOff(facts, 'editor'),
	scheduled: handover.scheduled(facts, 'Saturday 14 November 2026, 15:00 (CET)', 'tester'),
	unscheduled: handover.unscheduled(facts, 'author'),
	published: handover.published(facts, { edition: 1, again: false }, 'author'),
	publishedForLiaison: handover.publishedForLiaison(facts),
	notPublished: handover.notPublished(facts, 'Saturday', ['The embargo on Marlow G70 stands.'], 'editor'),
	withdrawn: handover.withdrawn(facts, 'The readings were of another rig.', 'author'),
	withdrawnForLiaison: handover.withdrawnForLiaison(facts),
	corrected: handover.corrected(facts, 'Figure 2 read 3.1 %.', 'tester')
};

describe('hand-over mails', () => {
	it.each(Object.entries(letters))(
		'%s: names the article, says the same twice, has one link',
		(_, letter) => {
			expect(letter.subject).toContain('Brisk 360');
			expect(letter.textBody).toContain(facts.title);
			expect(letter.htmlBody).toContain('Brisk 360: quiet &lt;at&gt; what price');
			expect(letter.htmlBody).not.toContain('<at>');
			expect(letter.textBody.match(/https?:\/\//g)).toHaveLength(1);
			expect(letter.htmlBody.match(/href=/g)).toHaveLength(1);
			expect(letter.textBody).toContain('You get this because');
		}
	);

	it('carries the words of whoever asked, escaped', () => {
		expect(letters.changesAsked.textBody).toContain('> Say <b>where</b> you measured.');
		expect(letters.changesAsked.htmlBody).toContain('Say &lt;b&gt;where&lt;/b&gt; you measured.');
	});

	it('leads the author to the text and the editor to the review', () => {
		expect(letters.changesAsked.textBody).toContain(`${facts.editHref}\n`);
		expect(letters.submitted.textBody).toContain(facts.reviewHref);
	});

	it('tells the liaison title and link alone', () => {
		for (const letter of [letters.publishedForLiaison, letters.withdrawnForLiaison]) {
			expect(letter.textBody).toContain(facts.publicHref);
			expect(letter.textBody).not.toContain('/desk/articles');
			expect(letter.textBody).not.toContain('readings');
		}
	});

	it('names every reason for not printing', () => {
		expect(letters.notPublished.textBody).toContain('The embargo on Marlow G70 stands.');
	});
});
