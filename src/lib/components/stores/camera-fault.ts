const words: Record<string, string> = {
	NotAllowedError:
		'The browser was not allowed to use the camera. Allow it for this address, or type the code.',
	NotFoundError: 'There is no camera on this device. Type the code that stands on the label.',
	NotReadableError: 'The camera is in use by another program. Close that one, or type the code.',
	InsecureError:
		'Browsers give a camera only to pages with a secure address (https). Type the code that stands on the label.'
};

/** Why there is no picture, and what to do, by the name of the browser's error. */
export const cameraFault = (name: string): string =>
	words[name] ?? 'The camera did not start. Type the code that stands on the label.';
