/** What readers call each kind of article; the key is the template it began from. */
export const articleKinds: Record<string, { one: string; many: string }> = {
	'tuning-guide': { one: 'Tuning guide', many: 'Tuning guides' },
	'product-test': { one: 'Product test', many: 'Product tests' },
	comparison: { one: 'Comparison', many: 'Comparisons' },
	'short-note': { one: 'Short note', many: 'Short notes' }
};

/** The name of an article's kind; a template of the lab's own is called an article. */
export const kindOf = (template: string): string => articleKinds[template]?.one ?? 'Article';
