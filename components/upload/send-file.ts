import { readOutcome, type UploadOutcome } from './upload-outcome';

export type Sending = { done: Promise<UploadOutcome>; stop: () => void };

/** A file as it was when it was chosen: what is checked and what is submitted are the same bytes. */
export type ChosenFile = { name: string; bytes: Blob };

/** Sends the bare bytes. XMLHttpRequest, since fetch does not tell how much has been sent. */
export function sendFile(address: string, file: ChosenFile, onProgress: (share: number) => void): Sending {
  const request = new XMLHttpRequest();
  const done = new Promise<UploadOutcome>((resolve) => {
    request.onload = () => resolve(readOutcome(request.status, request.responseText));
    request.onerror = () => resolve({ kind: 'unreachable' });
    request.onabort = () => resolve({ kind: 'stopped' });
  });
  request.upload.onprogress = ({ loaded, total }) => onProgress(total > 0 ? loaded / total : 1);
  request.open('POST', withQuery(address, { name: file.name }));
  request.setRequestHeader('content-type', 'text/csv');
  request.setRequestHeader('accept', 'application/json');
  request.send(file.bytes);
  return { done, stop: () => request.abort() };
}

export function withQuery(address: string, fields: Record<string, string>): string {
  const [path = '', query = ''] = address.split('?');
  const search = new URLSearchParams(query);
  for (const [key, value] of Object.entries(fields)) search.set(key, value);
  return `${path}?${search}`;
}
