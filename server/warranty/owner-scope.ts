import type { Viewer } from '#domain/viewer.ts';

/**
 * Whose warranties a viewer may see, as a condition on `warranties w` or anything of its `case_id`:
 * staff all, a customer those of cases they are the owner in. Whoever brought it or pays sees none.
 */
export function ownerScope(viewer: Viewer): { sql: string; params: Record<string, string> } {
  switch (viewer.kind) {
    case 'staff':
      return { sql: 'TRUE', params: {} };
    case 'customer':
      return {
        sql: `EXISTS (SELECT 1 FROM parties scope WHERE scope.case_id = w.case_id
                      AND scope.part = 'owner' AND scope.customer_id = :viewerId)`,
        params: { viewerId: viewer.customerId },
      };
    case 'public':
      return { sql: 'FALSE', params: {} };
  }
}
