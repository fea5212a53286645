import type { World } from '../act';
import { idle, towerFans } from '../campaigns/cooling';
import { memoryRates } from '../campaigns/memory';
import { fourWays } from '../campaigns/processor';
import { prose, Story } from './story';

/** The sentence as the first edition had it, and as the correction put it right. */
const right =
	'It gains :gain{workload=tile-render profile=fixed-470 show=size} in the render and pays for it in everything that lives on one core: the sieve is :gain{workload=prime-sieve profile=fixed-470 show=size} slower.';
const wrong =
	'It gains :gain{workload=tile-render profile=fixed-470 show=size} in the render and costs nothing worth naming elsewhere.';

const guide = (world: World) =>
	new Story(world, {
		title: 'Aldermoor 1650: four ways to spend sixteen cores',
		standfirst:
			'A fixed clock wins the long renders and loses the short tasks. Letting the board change over by current gives back most of both.',
		template: 'tuning-guide',
		campaigns: [fourWays.slug],
		author: 'Ines'
	})
		.start(-33, '09:20')
		.save([-32, '15:40'], prose('four-ways').split('\n## Is it stable?')[0]?.replace(right, wrong) ?? '')
		.save([-30, '11:15'], prose('four-ways').replace(right, wrong), 'with a part on stability')
		.submit(-29, '09:05')
		.comment([-28, '10:30'], {
			name: 'guide/one processor',
			who: 'Marit',
			quote: 'yours may hold a little more, or a little less',
			body: 'Good. Can we say this nearer to the steps as well?'
		})
		.comment([-28, '13:10'], {
			name: 'guide/one processor, answered',
			who: 'Ines',
			body: 'The sentence before the first card says it now.',
			answers: 'guide/one processor'
		})
		.resolve([-28, '14:00'], 'Marit', 'guide/one processor')
		.approve(-27, '10:00')
		.schedule([-27, '10:05'], [-24, '15:00'])
		.slotComes(-24, '15:00')
		.revise(
			[-12, '10:10'],
			'The first edition said that the fixed clock of 4.70 GHz costs nothing worth naming outside the render. It does: the prime sieve is slower, as the table of results showed from the start. The sentence is put right; no figure changed.'
		)
		.save([-12, '11:30'], prose('four-ways'), 'the prime sieve at 4.70')
		.submit(-12, '11:35')
		.approve(-11, '09:00')
		.publish(-11, '09:15');

const fan = (world: World) =>
	new Story(world, {
		title: 'What a second fan buys',
		standfirst: 'A few degrees, which can be heard. In an open room, leave it still.',
		template: 'short-note',
		campaigns: [towerFans.slug],
		author: 'Noor'
	})
		.start(-36, '13:00')
		.save([-35, '10:20'], prose('second-fan'))
		.submit(-35, '10:30')
		.approve(-34, '09:30')
		.publish(-20, '09:00')
		.clarify(
			[-17, '12:40'],
			'A reader asked whether the cooler was remounted between the two profiles. It was not, and the text says so; the fan stood still or ran, and nothing else changed.'
		);

const kit = (world: World) =>
	new Story(world, {
		title: 'Pennon 6000, tested: one line in a menu',
		standfirst:
			'A good kit that most people will run as a slow one. Past its label there is nothing to be had.',
		template: 'product-test',
		campaigns: [memoryRates.slug],
		author: 'Noor'
	})
		.start(-12, '09:15')
		.save([-10, '16:00'], prose('pennon'))
		.submit(-9, '09:00')
		.comment([-8, '11:00'], {
			name: 'kit/median',
			who: 'Pelle',
			quote: 'Latency is printed as a median',
			body: 'True for all four rates, and the means are within the same interval. Nothing to change.'
		})
		.approve(-7, '15:20')
		.schedule([-7, '15:30'], [-1, '09:00'])
		.slotComes(-1, '09:00');

const sleep = (world: World) =>
	new Story(world, {
		title: 'What idle costs',
		standfirst: 'One setting, a few watts, and nothing we could find against it.',
		template: 'short-note',
		campaigns: [idle.slug],
		author: 'Ines'
	})
		.start(-40, '10:00')
		.save([-40, '14:30'], prose('idle'))
		.submit(-40, '14:40')
		.approve(-38, '09:10')
		.publish(-37, '09:00')
		.withdraw(
			[-26, '16:30'],
			'The meter at the wall reads low by an amount that changes with the load; its maker confirmed the fault. The saving may be smaller than we printed. We will measure again with another meter and print that.'
		);

/** What readers have, or had. */
export const printedArticles = (world: World) =>
	[sleep, fan, guide, kit].flatMap((story) => story(world).acts);
