import type { Sight } from '#app/lib/views/entry-view.ts';
import { viewerPhotos } from '#app/lib/views/viewer-photos.ts';
import type { Viewer } from '#domain/viewer.ts';
import { getOwnCase } from '#server/cases/get-own-case.ts';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { listCasePhotos } from '#server/photos/list-case-photos.ts';
import { readShop } from '#server/shop/read-shop.ts';

/** A customer's own case with what they may see of its timeline; photos in full when one is asked for. */
export async function loadOwnCase(viewer: Viewer, number: string, photo: string | null) {
  const now = new Date();
  const [own, timeline, shop, photos] = await Promise.all([
    getOwnCase(viewer, { number }, { now }),
    listTimeline(viewer, { caseNumber: number }),
    readShop(),
    photo === null ? null : listCasePhotos(viewer, { caseNumber: number }),
  ]);
  const sight: Sight = { now, zone: shop.timeZone, photoHref: (n) => `?photo=${n}` };
  return { own, timeline, sight, photos: photos && viewerPhotos(timeline, photos, sight) };
}
