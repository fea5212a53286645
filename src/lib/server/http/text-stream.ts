/** A body that is sent while it is made, piece by piece, and no faster than it is read. */
export function byteStream(pieces: AsyncIterator<Uint8Array>): ReadableStream<Uint8Array> {
	return new ReadableStream({
		async pull(controller) {
			const next = await pieces.next();
			if (next.done) controller.close();
			else controller.enqueue(next.value);
		},
		async cancel() {
			await pieces.return?.();
		}
	});
}

/** The same of text. */
export function textStream(pieces: AsyncIterator<string>): ReadableStream<Uint8Array> {
	const encoder = new TextEncoder();
	return byteStream({
		async next() {
			const next = await pieces.next();
			return next.done
				? { done: true, value: undefined }
				: { done: false, value: encoder.encode(next.value) };
		},
		async return() {
			await pieces.return?.();
			return { done: true, value: undefined };
		}
	});
}
