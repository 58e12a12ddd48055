import { renderToStaticMarkup } from 'react-dom/server';
import { createMemoryRouter, RouterProvider } from 'react-router';
import { expect, it } from 'vitest';
import { PhotoDrop } from './photo-drop.tsx';

const entryId = '019b0000-0000-7000-8000-000000000001';

function markup(at: string): string {
  const element = <PhotoDrop caseNumber="2026-031" entryId={entryId} />;
  const router = createMemoryRouter([{ path: '*', element }], { initialEntries: [at] });
  return renderToStaticMarkup(<RouterProvider router={router} />);
}

it('is a plain form that sends many files and leads back, before the page’s program has come', () => {
  const html = markup('/bench/cases/2026-031/add?step=what');
  const action = /action="([^"]+)"/.exec(html)?.[1]?.replaceAll('&amp;', '&');
  expect(action).toBe(
    `/api/cases/2026-031/photos/form?entry=${entryId}&back=%2Fbench%2Fcases%2F2026-031%2Fadd%3Fstep%3Dwhat`,
  );
  expect(html).toContain('encType="multipart/form-data" method="post"');
  expect(html).toMatch(/<input[^>]+type="file"[^>]+name="photos"/);
  expect(html).toMatch(/<input[^>]+multiple=""[^>]+tabindex="0"/);
  expect(html).toContain('Send the photos');
  expect(html).not.toContain('Take a photo');
});
