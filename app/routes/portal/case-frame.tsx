import { lazy, Suspense, type ReactNode } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import { PortalTabs } from '#app/ui/bar/portal-tabs.tsx';
import { PortalPage } from '#app/ui/portal/portal-page.tsx';
import type { ViewerPhotoView } from '#app/ui/types.ts';
import { kindInSentence } from '#domain/instrument-kinds.ts';

const PhotoViewer = lazy(() =>
  import('#app/ui/viewer/photo-viewer.tsx').then((module) => ({ default: module.PhotoViewer })),
);

interface Props {
  number: string;
  kind: string;
  sub: ReactNode;
  tab: 'now' | 'timeline';
  /** The photos in full, when one of them is asked for. */
  photos: ViewerPhotoView[] | null;
  children: ReactNode;
}

/** Around the pages of one case in the portal: its name, the tabs, a photo in full. */
export function CaseFrame({ number, kind, sub, tab, photos, children }: Props) {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const here = `/portal/cases/${number}`;
  const shown = photos?.findIndex(({ n }) => String(n) === search.get('photo')) ?? -1;
  const go = (to: string) => void navigate(to, { replace: true, preventScrollReset: true });
  return (
    <>
      <title>{`Your ${kindInSentence(kind)} · Witnessmark`}</title>
      <PortalPage title={`Your ${kindInSentence(kind)}`} sub={sub}>
        {children}
      </PortalPage>
      <PortalTabs
        tabs={[
          { label: 'Now', href: here, current: tab === 'now' },
          { label: 'Timeline', href: `${here}/timeline`, current: tab === 'timeline' },
          { label: 'Warranty', href: `${here}/warranty` },
        ]}
      />
      {photos && shown >= 0 && (
        <Suspense>
          <PhotoViewer
            caseNumber={number}
            photos={photos}
            index={shown}
            onIndex={(index) => go(`?photo=${photos[index]?.n ?? ''}`)}
            onClose={() => go('?')}
          />
        </Suspense>
      )}
    </>
  );
}
