import { Links, Meta, Outlet, Scripts, ScrollRestoration } from 'react-router';

export default function Root() {
  return (
    <html lang="en">
      <head>
        <link rel="icon" href="data:," />
        <Meta />
        <Links />
      </head>
      <body>
        <Outlet />
        <ScrollRestoration />
        <Scripts />
      </body>
    </html>
  );
}
