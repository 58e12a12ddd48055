import type { Route } from './+types/photos';
import { viewerContext } from '#app/context.ts';
import { problemResponse } from '#app/lib/problem.ts';
import { may } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { sessionViewer } from '#server/auth/session-viewer.ts';
import { ArrivedDamaged } from '#server/photos/arrived-damaged.ts';
import { putPhoto } from '#server/photos/put-photo.ts';
import { takePhotoForm } from './photo-form.ts';
import { piecesOf } from './request-body.ts';

const SIGNED_OUT = 'You were signed out while the photo went up. Sign in and send it again.';
const NO_METHOD = 'A photo is sent by PUT. Open the case and add it there.';

function decoded(name: string | null): string | null {
  try {
    return name === null ? null : decodeURIComponent(name);
  } catch {
    return null;
  }
}

/** What the headers say of the file; browsers that know no type say octet-stream, which says nothing. */
function saidIn(headers: Headers) {
  const type = headers.get('Content-Type');
  return {
    sha256: headers.get('X-Content-SHA256')?.toLowerCase() ?? '',
    length: Number(headers.get('Content-Length') ?? Number.NaN),
    mediaType: type === null || type === 'application/octet-stream' ? null : type,
    fileName: decoded(headers.get('X-File-Name')),
  };
}

/** An upload takes long enough for a session to end, or a person to be removed, in the middle of it. */
async function stillSignedIn(request: Request, viewer: Viewer): Promise<void> {
  const now = await sessionViewer(request);
  const same = now.kind === 'staff' && viewer.kind === 'staff' && now.personId === viewer.personId;
  if (same && may(now, 'add photos and notes')) return;
  throw Response.json({ code: 'signed-out', sentence: SIGNED_OUT }, { status: 401 });
}

/**
 * PUT takes one photo by its id and hash: 201 when it is new, 200 when the same file was there.
 * Sending again after any other answer, or none, is safe. POST takes a form of photos from a page
 * whose program has not come; the id in the address is then not used.
 */
export async function action({ request, url, params, context }: Route.ActionArgs) {
  const viewer = context.get(viewerContext);
  const isForm = request.headers.get('Content-Type')?.startsWith('multipart/form-data') ?? false;
  if (request.method === 'POST' && isForm) {
    return takePhotoForm(viewer, request, { caseNumber: params.number, url });
  }
  if (request.method !== 'PUT') {
    return Response.json({ code: 'method', sentence: NO_METHOD }, { status: 405 });
  }
  const reader = (request.body ?? new Blob().stream()).getReader();
  try {
    const entryId = url.searchParams.get('entry');
    const input = {
      caseNumber: params.number,
      photoId: params.photoId,
      entryId,
      ...saidIn(request.headers),
    };
    const { photo, isNew, linked } = await putPhoto(viewer, input, piecesOf(reader), {
      stillAllowed: () => stillSignedIn(request, viewer),
    });
    return Response.json({ photo, linked }, { status: isNew ? 201 : 200 });
  } catch (error) {
    if (!(error instanceof ArrivedDamaged)) return problemResponse(error);
    const { code, sentence } = error;
    return Response.json({ code, sentence, fields: {} }, { status: 400 });
  }
}
