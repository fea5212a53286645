import { scaleLinear } from 'd3-scale';
import { tickDecimals } from './layout';

export interface PlotDomain {
	domain: [number, number];
	ticks: number[];
	/** Decimals that tell the ticks apart. */
	decimals: number;
}

/** An axis around values, with room at both ends; it does not begin at nought, for clocks and volts lie far from it. */
export function plotDomain(values: readonly number[], count: number): PlotDomain {
	const low = Math.min(...values);
	const high = Math.max(...values);
	const room = (high - low) * 0.06 || Math.abs(high) * 0.01 || 1;
	const scale = scaleLinear()
		.domain([low - room, high + room])
		.nice(count);
	const [from = 0, to = 1] = scale.domain();
	const ticks = scale.ticks(count);
	return { domain: [from, to], ticks, decimals: tickDecimals(ticks) };
}
