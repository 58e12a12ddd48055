import type { WaitingPhoto } from './waiting-photo.ts';

/** What became of one attempt to send a photo. */
export type Outcome =
  /** It is safe with the shop; `id` is that of the photo there, another one when the file was known. */
  | { kind: 'up'; id: string; number: number }
  /** Sending it again will not help. */
  | { kind: 'refused'; sentence: string }
  /** The person has to do something first, then it can be sent again. */
  | { kind: 'stopped'; sentence: string }
  /** To be tried again by itself: there is no connection, or the shop is busy. */
  | { kind: 'no signal' }
  | { kind: 'busy'; sentence: string };

/** What is said of the file with it. */
export interface Letter {
  photo: WaitingPhoto;
  sha256: string;
  mediaType: string;
  /** Told how many bytes have gone. */
  onProgress: (sent: number) => void;
}

interface Answer {
  photo?: { id: string; number: number };
  code?: string;
  sentence?: string;
}

const UNCLEAR = 'The shop’s program gave no answer that can be read. Try again.';

function answerOf(request: XMLHttpRequest): Answer {
  try {
    return JSON.parse(request.responseText) as Answer;
  } catch {
    return {};
  }
}

function outcomeOf(status: number, { photo, code, sentence = UNCLEAR }: Answer): Outcome {
  if (photo && status < 300) return { kind: 'up', id: photo.id, number: photo.number };
  if (status === 401) return { kind: 'stopped', sentence };
  if (status >= 500 || status === 429 || code === 'arrived-damaged') {
    return { kind: 'busy', sentence };
  }
  // An answer of something between here and the shop says nothing about the photo.
  return code === undefined ? { kind: 'busy', sentence } : { kind: 'refused', sentence };
}

const addressOf = ({ caseNumber, id, entryId }: WaitingPhoto) =>
  `/api/cases/${encodeURIComponent(caseNumber)}/photos/${id}?entry=${encodeURIComponent(entryId)}`;

/** Sends one photo in one request. XMLHttpRequest, because fetch does not tell how much has gone. */
export function sendPhoto({ photo, sha256, mediaType, onProgress }: Letter): Promise<Outcome> {
  return new Promise((resolve) => {
    const request = new XMLHttpRequest();
    request.open('PUT', addressOf(photo));
    request.setRequestHeader('Content-Type', mediaType);
    request.setRequestHeader('X-Content-SHA256', sha256);
    request.setRequestHeader('X-File-Name', encodeURIComponent(photo.name));
    request.upload.onprogress = ({ loaded }) => onProgress(loaded);
    request.onload = () => resolve(outcomeOf(request.status, answerOf(request)));
    request.onerror = () => resolve({ kind: 'no signal' });
    request.ontimeout = () => resolve({ kind: 'no signal' });
    request.onabort = () => resolve({ kind: 'no signal' });
    request.send(photo.file);
  });
}
