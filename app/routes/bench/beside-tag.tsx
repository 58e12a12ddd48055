import type { ReactNode } from 'react';
import { AddSheet } from '#app/ui/add/add-sheet.tsx';
import { Tag } from '#app/ui/tag/tag.tsx';
import type { CaseTagView } from '#app/ui/types.ts';

/**
 * The sheet of an entry, on a desk beside the case's tag: the commonest loss in a shop is the photo on
 * the wrong job. The phone names the case over the sheet.
 */
export function BesideTag({ tag, children }: { tag: CaseTagView; children: ReactNode }) {
  return (
    <div className="case:grid case:grid-cols-[minmax(0,1fr)_30rem]">
      <aside className="hidden justify-items-center p-16 case:grid" aria-label="Case">
        <div className="sticky top-16 h-fit w-[17rem]">
          <Tag tag={tag} />
        </div>
      </aside>
      <AddSheet>{children}</AddSheet>
    </div>
  );
}
