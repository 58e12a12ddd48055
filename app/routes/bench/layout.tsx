import { Outlet, useLocation, useMatches } from 'react-router';
import type { Route } from './+types/layout';
import { viewerContext } from '#app/context.ts';
import { ErrorPage } from '#app/lib/error-page.tsx';
import { refuse } from '#app/lib/problem.ts';
import { StaffBar } from '#app/ui/bar/staff-bar.tsx';
import { themeOf } from '#app/ui/bar/theme.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { StaffMenu } from './staff-menu.tsx';

/** What a page of the bench says of the bar over it: none, or on the desk only. */
export interface BenchHandle {
  bar?: 'none' | 'desk';
}

export async function loader({ context, request }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const { name: shop } = await readShop().catch(refuse);
  return {
    shop,
    person: viewer.kind === 'public' ? '' : viewer.name,
    theme: themeOf(request.headers.get('Cookie')),
  };
}

export default function BenchLayout({ loaderData }: Route.ComponentProps) {
  const { pathname, search } = useLocation();
  const bars = useMatches().map(({ handle }) => (handle as BenchHandle | undefined)?.bar);
  const links = [
    { label: 'Rack', href: '/bench', current: pathname === '/bench' },
    { label: 'Warranty', href: '/bench/warranties', current: pathname === '/bench/warranties' },
    { label: 'Verify', href: '/verify' },
  ];
  return (
    <>
      {!bars.includes('none') && (
        <StaffBar
          home="/bench"
          links={links}
          person={loaderData.person}
          shop={loaderData.shop}
          findAction="/bench/find"
          query={pathname === '/bench/find' ? (new URLSearchParams(search).get('q') ?? '') : ''}
          menu={<StaffMenu theme={loaderData.theme} />}
          deskOnly={bars.includes('desk')}
        />
      )}
      <Outlet />
    </>
  );
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} />;
}
