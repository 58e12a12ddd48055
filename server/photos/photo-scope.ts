import type { Viewer } from '#domain/viewer.ts';
import { caseScope, type Scope } from '#server/cases/case-scope.ts';

/** For a customer a photo is there when any of its links is shared, on a sealed and shared entry. */
const SHARED = `EXISTS (
  SELECT 1 FROM entry_photos l JOIN entries e ON e.id = l.entry_id
  WHERE l.photo_id = f.id AND l.visibility = 'shared'
    AND e.visibility = 'shared' AND e.leaf_index IS NOT NULL)`;

/**
 * The photos a viewer may see, as a condition on `photos f JOIN cases c`: staff all, a customer the
 * shared and sealed ones of their cases, others none.
 */
export function photoScope(viewer: Viewer): Scope {
  const { sql, params } = caseScope(viewer);
  return viewer.kind === 'staff' ? { sql, params } : { sql: `${sql} AND ${SHARED}`, params };
}
