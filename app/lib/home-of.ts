import type { Viewer } from '#domain/viewer.ts';

/** The first page of each: the Rack, one's own instruments, or the sign-in. */
export function homeOf(viewer: Viewer): string {
  return { staff: '/bench', customer: '/portal', public: '/sign-in' }[viewer.kind];
}
