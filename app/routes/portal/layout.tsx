import { Form, Outlet } from 'react-router';
import type { Route } from './+types/layout';
import { viewerContext } from '#app/context.ts';
import { ErrorPage } from '#app/lib/error-page.tsx';
import { refuse } from '#app/lib/problem.ts';
import { PortalBar } from '#app/ui/bar/portal-bar.tsx';
import { Button } from '#app/ui/control/button.tsx';
import { readShop } from '#server/shop/read-shop.ts';

export async function loader({ context }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const { name, place, telephone, email } = await readShop().catch(refuse);
  const who = viewer.kind === 'customer' ? viewer.name : '';
  return { shop: name, town: place, reach: `${telephone}, ${email}`, who };
}

export default function PortalLayout({ loaderData }: Route.ComponentProps) {
  const { shop, town, reach, who } = loaderData;
  return (
    <>
      <PortalBar home="/portal" shop={shop} town={town} />
      <Outlet />
      <footer className="mx-auto grid max-w-[40rem] gap-3 px-4.5 pb-28 text-label text-ink-2">
        <p>
          {shop}, {town}. {reach}.
        </p>
        <Form method="post" action="/sign-out" className="flex flex-wrap items-center gap-x-4">
          <span>Signed in as {who}.</span>
          <Button kind="text">Sign out</Button>
        </Form>
      </footer>
    </>
  );
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} />;
}
