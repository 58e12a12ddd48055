import type { Viewer } from '#domain/viewer.ts';

/** A condition on `cases c` with its named values. */
export interface Scope {
  sql: string;
  params: Record<string, string>;
}

/**
 * The cases a viewer may see: staff all, a customer those they are a party of, others none. Goes into
 * the WHERE of every query that reads a case, so that a foreign case cannot be told from none.
 */
export function caseScope(viewer: Viewer): Scope {
  switch (viewer.kind) {
    case 'staff':
      return { sql: 'TRUE', params: {} };
    case 'customer':
      return {
        sql: `EXISTS (SELECT 1 FROM parties scope
                      WHERE scope.case_id = c.id AND scope.customer_id = :viewerId)`,
        params: { viewerId: viewer.customerId },
      };
    case 'public':
      return { sql: 'FALSE', params: {} };
  }
}
