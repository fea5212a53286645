/** One message of a stream of server-sent events. */
export interface ServerMessage {
	event: string;
	/** By which a browser that lost the line says what it had last. */
	id: number;
	data: unknown;
}

export interface StreamTools {
	send: (message: ServerMessage) => void;
	end: () => void;
}

interface StreamOptions {
	/** Asked before each message and with each heartbeat; false ends the stream. */
	stillAllowed: () => Promise<boolean>;
	heartbeatMs?: number;
	/** Milliseconds after which a browser that lost the line comes again. */
	retryMs?: number;
}

/** Messages that may lie unread before a reader is given up; it comes again and is told what it missed. */
const mostUnread = 200;

const encoder = new TextEncoder();
const written = ({ event, id, data }: ServerMessage) =>
	`id: ${id}\nevent: ${event}\ndata: ${JSON.stringify(data)}\n\n`;

/**
 * A response that stays open and sends messages (text/event-stream), with a comment now and then so that nothing on the
 * way takes it for dead.
 * @param begin called once; returns what to do when the stream ends, whoever ends it
 */
export function eventStream(
	begin: (tools: StreamTools) => () => void,
	{ stillAllowed, heartbeatMs = 20_000, retryMs = 3000 }: StreamOptions
): Response {
	let finish = () => {};
	const body = new ReadableStream<Uint8Array>({
		start(controller) {
			let open = true;
			let leave = () => {};
			finish = () => {
				if (!open) return;
				open = false;
				clearInterval(beat);
				leave();
			};
			const end = () => {
				if (!open) return;
				finish();
				controller.close();
			};
			const write = (text: string) => {
				if (!open) return;
				if ((controller.desiredSize ?? 0) < -mostUnread) end();
				else controller.enqueue(encoder.encode(text));
			};
			// One after the other: a later message must not overtake an earlier one.
			let line: Promise<void> = Promise.resolve();
			const ifAllowed = (text: string) => {
				line = line.then(stillAllowed).then(
					(allowed) => (allowed ? write(text) : end()),
					() => end()
				);
			};
			const beat = setInterval(() => ifAllowed(': here\n\n'), heartbeatMs);
			write(`retry: ${retryMs}\n\n`);
			leave = begin({ send: (message) => ifAllowed(written(message)), end });
			if (!open) leave();
		},
		cancel: () => finish()
	});
	return new Response(body, {
		headers: {
			'content-type': 'text/event-stream',
			'cache-control': 'no-store',
			// Proxies that gather answers would hold the messages back.
			'x-accel-buffering': 'no'
		}
	});
}
