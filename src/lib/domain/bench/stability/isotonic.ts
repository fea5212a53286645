interface Block {
	/** Weighted mean of the block. */
	mean: number;
	weight: number;
	count: number;
}

const merged = (a: Block, b: Block): Block => ({
	mean: a.mean + ((b.mean - a.mean) * b.weight) / (a.weight + b.weight),
	weight: a.weight + b.weight,
	count: a.count + b.count
});

/**
 * The values nearest to those given, by weighted least squares, that never fall (or never rise): pool adjacent
 * violators. Sources: Barlow et al. 1972; Busing 2022, J. Stat. Softw. 102(1), whose examples are in the test.
 * RangeError for a value that is not finite, a weight that is not above zero, or lists of unequal length.
 * @example isotonic([1, 0, 4, 3, 3, 5, 4, 2, 0]) // [0.5, 0.5, 3, 3, 3, 3, 3, 3, 3]
 */
export function isotonic(
	values: readonly number[],
	{ weights, direction = 'rising' }: { weights?: readonly number[]; direction?: 'rising' | 'falling' } = {}
): number[] {
	if (weights && weights.length !== values.length)
		throw new RangeError('A fit needs as many weights as values.');
	const wrongWay = (before: number, after: number) =>
		direction === 'rising' ? before >= after : before <= after;
	const blocks: Block[] = [];
	for (const [index, value] of values.entries()) {
		const weight = weights?.[index] ?? 1;
		if (!Number.isFinite(value)) throw new RangeError('Every value must be finite.');
		if (!(weight > 0 && Number.isFinite(weight))) throw new RangeError('Every weight must be above zero.');
		let block: Block = { mean: value, weight, count: 1 };
		for (let last = blocks.at(-1); last && wrongWay(last.mean, block.mean); last = blocks.at(-1)) {
			block = merged(last, block);
			blocks.pop();
		}
		blocks.push(block);
	}
	return blocks.flatMap(({ mean, count }) => Array.from({ length: count }, () => mean));
}
