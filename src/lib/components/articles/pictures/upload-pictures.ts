import { pictureLimitBytes, type PictureFacts } from '../../../domain/articles/pictures/picture';

/** A picture that is in the store now. */
export interface UploadedPicture extends PictureFacts {
	/** What to write in Markdown between the parentheses. */
	address: string;
	alt: string;
	credit: string;
	known: boolean;
	notes: string[];
}

/** What came of one file. */
export type UploadAnswer =
	{ ok: true; file: File; picture: UploadedPicture } | { ok: false; file: File; message: string };

export interface UploadOptions {
	/** How far a file is; called as its bytes go out. */
	onprogress?: (file: File, sentBytes: number) => void;
	/** Called as each file is done, before the next begins. */
	ondone?: (answer: UploadAnswer) => void;
	/** Stops what is on its way; what is stored already stays. */
	signal?: AbortSignal;
}

const words = (text: string): string | undefined => {
	try {
		return (JSON.parse(text) as { detail?: string }).detail;
	} catch {
		return undefined;
	}
};

/** Sends one file. XMLHttpRequest, because fetch does not say how much of a body went out. */
function send(file: File, { onprogress, signal }: UploadOptions): Promise<UploadAnswer> {
	const no = (message: string): UploadAnswer => ({ ok: false, file, message });
	if (file.size > pictureLimitBytes)
		return Promise.resolve(no(`It is larger than ${pictureLimitBytes / 1e6} MB. Save it smaller first.`));
	return new Promise((resolve) => {
		const request = new XMLHttpRequest();
		request.open('POST', `/api/v1/pictures?name=${encodeURIComponent(file.name.slice(0, 200))}`);
		request.upload.onprogress = ({ loaded }) => onprogress?.(file, loaded);
		request.onload = () => {
			if (request.status === 201)
				resolve({ ok: true, file, picture: JSON.parse(request.responseText) as UploadedPicture });
			else if (request.status === 401)
				resolve(no('You are signed out. Sign in in another tab, then send it again.'));
			else resolve(no(words(request.responseText) ?? 'The server did not take it. Send it again.'));
		};
		request.onerror = () => resolve(no('There is no connection. Send it again when there is one.'));
		request.onabort = () => resolve(no('It was stopped.'));
		signal?.addEventListener('abort', () => request.abort(), { once: true });
		if (signal?.aborted) resolve(no('It was stopped.'));
		else request.send(file);
	});
}

/**
 * Puts files into the picture store one after the other, and says of each what came of it; it never throws.
 * @example await uploadPictures([...event.dataTransfer.files], { onprogress: (file, sent) => (bytes = sent) })
 */
export async function uploadPictures(files: File[], options: UploadOptions = {}): Promise<UploadAnswer[]> {
	const answers: UploadAnswer[] = [];
	for (const file of files) {
		const answer = await send(file, options);
		answers.push(answer);
		options.ondone?.(answer);
	}
	return answers;
}

/** Says what a stored picture shows, so that it is offered where the picture is used again. */
export async function describePicture(
	sha256: string,
	said: { alt: string; credit: string }
): Promise<boolean> {
	const answer = await fetch(`/api/v1/pictures/${sha256}`, {
		method: 'PATCH',
		headers: { 'content-type': 'application/json' },
		body: JSON.stringify(said)
	}).catch(() => null);
	return answer?.ok ?? false;
}
