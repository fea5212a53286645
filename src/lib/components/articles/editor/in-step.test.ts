import { describe, expect, it } from 'vitest';
import { InStep } from './in-step';

const pane = (length: number) =>
	({ scrollTop: 0, scrollHeight: length + 500, clientHeight: 500 }) as HTMLElement;

describe('source and page', () => {
	it('follow each other by their blocks, and what follows does not lead back', () => {
		const [source, page] = [pane(1000), pane(4000)];
		const both = new InStep(source, page, () => [{ from: 200, to: 2000 }]);
		source.scrollTop = 200;
		both.scrolled('source');
		expect(page.scrollTop).toBe(2000);
		// The event of the page that was scrolled for it.
		source.scrollTop = 210;
		both.scrolled('page');
		expect(source.scrollTop).toBe(210);
		// And of the page that a person scrolls then.
		page.scrollTop = 1000;
		both.scrolled('page');
		expect(source.scrollTop).toBe(100);
	});

	it('measure anew once something moved', () => {
		const [source, page] = [pane(1000), pane(4000)];
		let to = 2000;
		const both = new InStep(source, page, () => [{ from: 200, to }]);
		both.scrolled('source');
		to = 3000;
		both.moved();
		source.scrollTop = 200;
		both.scrolled('source');
		expect(page.scrollTop).toBe(3000);
	});
});
