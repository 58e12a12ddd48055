import type { ReactNode } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { createMemoryRouter, RouterProvider } from 'react-router';

/** The HTML of a component, inside a router so that its links and forms work. */
export function markup(children: ReactNode): string {
  const router = createMemoryRouter([{ path: '*', element: children }]);
  return renderToStaticMarkup(<RouterProvider router={router} />);
}

/** What a reader sees of it: no tags, single spaces. */
export function words(children: ReactNode): string {
  return markup(children)
    .replace(/<[^>]+>/g, ' ')
    .replaceAll('&amp;', '&')
    .replace(/[\s\u00a0]+/g, ' ')
    .trim();
}
