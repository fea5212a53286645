// The readers' pages are whole without script, so none is sent.
export const csr = false;
