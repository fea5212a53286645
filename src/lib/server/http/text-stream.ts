/** A body that is sent while it is made, piece by piece, and no faster than it is read. */
export function textStream(pieces: AsyncIterator<string>): ReadableStream<Uint8Array> {
	const encoder = new TextEncoder();
	return new ReadableStream({
		async pull(controller) {
			const next = await pieces.next();
			if (next.done) controller.close();
			else controller.enqueue(encoder.encode(next.value));
		},
		async cancel() {
			await pieces.return?.();
		}
	});
}
