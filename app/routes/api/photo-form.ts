import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { Busboy } from '@fastify/busboy';
import { redirect } from 'react-router';
import { safeReturn } from '#app/lib/return-path.ts';
import { Problem } from '#domain/errors.ts';
import { MAX_PHOTO_BYTES } from '#domain/photo-file.ts';
import type { Viewer } from '#domain/viewer.ts';
import { putSpooledPhoto } from '#server/photos/put-spooled-photo.ts';

const LIMITS = { files: 40, fields: 10, parts: 60, fileSize: MAX_PHOTO_BYTES + 1 };

/** What did not go up, and why. */
interface Refused {
  name: string;
  sentence: string;
}

const escaped = (text: string) =>
  text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);

function refusalPage(refused: Refused[], back: string): Response {
  const rows = refused.map(
    ({ name, sentence }) => `<li><b>${escaped(name)}</b><br>${escaped(sentence)}</li>`,
  );
  const html = `<!doctype html><html lang="en-GB"><meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Did not go up · Witnessmark</title>
<h1>Did not go up</h1><ul>${rows.join('')}</ul><p>What is not named here is up.</p>
<p><a href="${escaped(back)}">Back</a></p></html>`;
  return new Response(html, {
    status: 400,
    headers: { 'Content-Type': 'text/html; charset=utf-8' },
  });
}

async function takeFile(
  viewer: Viewer,
  photo: { caseNumber: string; entryId: string | null },
  file: { name: string; type: string; stream: Readable },
): Promise<Refused | null> {
  const mediaType = file.type === 'application/octet-stream' ? null : file.type;
  try {
    await putSpooledPhoto(viewer, { ...photo, fileName: file.name, mediaType }, file.stream);
    return null;
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    return { name: file.name, sentence: error.sentence };
  } finally {
    // The rest of a refused file stands between the reader and the next one.
    file.stream.resume();
  }
}

/**
 * Takes photos out of a form that a page sends without its program, one after the other, and leads
 * back to the page; a page of its own says which did not go up, and why.
 */
export async function takePhotoForm(
  viewer: Viewer,
  request: Request,
  { caseNumber, url }: { caseNumber: string; url: URL },
): Promise<Response> {
  const photo = { caseNumber, entryId: url.searchParams.get('entry') };
  const back = safeReturn(url.searchParams.get('back')) ?? `/bench/cases/${caseNumber}`;
  const type = request.headers.get('Content-Type') ?? '';
  const form = new Busboy({ headers: { 'content-type': type }, limits: LIMITS });
  let before: Promise<unknown> = Promise.resolve();
  const refused: Refused[] = [];
  form.on('file', (_field, stream, name, _encoding, mediaType) => {
    // An input without a choice sends one file without a name.
    if (!name) stream.resume();
    else {
      before = before
        .then(() => takeFile(viewer, photo, { name, type: mediaType, stream }))
        .then((one) => one && refused.push(one));
      before.catch(() => stream.resume());
    }
  });
  await pipeline(Readable.fromWeb(request.body as never), form);
  await before;
  return refused.length === 0 ? redirect(back, 303) : refusalPage(refused, back);
}
