/** P(X ≤ k) of n tosses of a fair coin, by Pascal's terms in halves; 0 below k = 0. */
export function fairCoinAtMost(k: number, n: number): number {
	let term = 0.5 ** n;
	let sum = 0;
	for (let i = 0; i <= Math.min(k, n); i += 1) {
		sum += term;
		term *= (n - i) / (i + 1);
	}
	return sum;
}
