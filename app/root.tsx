import type { ReactNode } from 'react';
import { Links, Meta, Outlet, Scripts, ScrollRestoration, useRouteLoaderData } from 'react-router';
import type { Route } from './+types/root';
import './app.css';
import { criticalFonts } from './fonts/critical-fonts.ts';
import { guard } from './guard.ts';
import { ErrorPage } from './lib/error-page.tsx';
import { themeOf } from './ui/bar/theme.ts';

export const middleware: Route.MiddlewareFunction[] = [guard];

export const links: Route.LinksFunction = () => criticalFonts;

export function loader({ request }: Route.LoaderArgs) {
  return { theme: themeOf(request.headers.get('Cookie')) };
}

/** The document around every page, and around the error page too. */
export function Layout({ children }: { children: ReactNode }) {
  const theme = useRouteLoaderData<typeof loader>('root')?.theme ?? 'device';
  // The switch in the staff menu writes the attribute itself, ahead of the server's next answer.
  return (
    <html lang="en-GB" data-theme={theme === 'device' ? undefined : theme} suppressHydrationWarning>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1, viewport-fit=cover" />
        <link rel="icon" href="/favicon.svg" type="image/svg+xml" />
        <link rel="manifest" href="/manifest.webmanifest" />
        <Meta />
        <Links />
      </head>
      <body>
        {children}
        <ScrollRestoration />
        <Scripts />
      </body>
    </html>
  );
}

export default function Root() {
  return <Outlet />;
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} />;
}
