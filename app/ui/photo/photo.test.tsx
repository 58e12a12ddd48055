import { expect, it } from 'vitest';
import { markup, words } from '#tests/helpers/markup.tsx';
import type { PhotoView } from '../types.ts';
import { Mat } from './mat.tsx';
import { PhotoGroup } from './photo-group.tsx';
import { srcSet } from './photo-picture.tsx';
import { PinnedPhoto } from './pinned-photo.tsx';

const sizes = { single: '540px', pair: '262px' };

function photo(n: number, changes: Partial<PhotoView> = {}): PhotoView {
  return {
    id: `photo-${n}`,
    n,
    caption: 'Low from behind',
    alt: 'Bridge from behind, gap under its back edge',
    state: 'ready',
    src320: `/api/media/${n}/320`,
    src960: `/api/media/${n}/960`,
    src2048: `/api/media/${n}/2048`,
    width: 2048,
    height: 1536,
    pins: [],
    ...changes,
  };
}

it('says what is to be seen, and keeps the place of the picture free', () => {
  const html = markup(<Mat photo={photo(2)} sizes="540px" />);
  expect(html).toContain('alt="Bridge from behind, gap under its back edge"');
  expect(html).toContain('width="2048" height="1536"');
  expect(html).toContain('loading="lazy"');
  expect(words(<Mat photo={photo(2)} sizes="540px" />)).toBe('Photo 2 Low from behind');
});

it('names the true width of each size', () => {
  expect(srcSet(photo(1))).toBe(
    '/api/media/1/320 320w, /api/media/1/960 960w, /api/media/1/2048 2048w',
  );
  expect(srcSet(photo(1, { width: 1536, height: 2048 }))).toBe(
    '/api/media/1/320 240w, /api/media/1/960 720w, /api/media/1/2048 1536w',
  );
  expect(srcSet(photo(1, { width: 800, height: 600 }))).toContain('/api/media/1/2048 800w');
});

it('says in words why a picture is not there', () => {
  const missing = photo(16, { state: 'missing', note: 'Photo 16 is still on Tomasz’s phone.' });
  const html = markup(<Mat photo={missing} sizes="540px" />);
  expect(html).not.toContain('<img');
  expect(html).toContain('wm-hollow');
  expect(html).toContain('Photo 16 is still on Tomasz’s phone.');
  expect(words(<Mat photo={photo(3, { state: 'preparing' })} sizes="1px" />)).toContain(
    'Photo 3 is kept; its sizes are being made.',
  );
});

it('puts pins at their percent of the photo, each a named button, and their lines beside', () => {
  const pinned = photo(2, {
    pins: [
      { n: 1, kind: 'damage', x: 79, y: 62.5, title: 'Back edge lifted.', text: 'Open.' },
      { n: 2, kind: 'remark', x: 0, y: 100, title: 'Slip of paper,', text: 'as far as it goes.' },
    ],
  });
  const html = markup(<PinnedPhoto photo={pinned} sizes="540px" />);
  expect(html).toContain('style="left:79%;top:62.5%"');
  expect(html).toContain('style="left:0%;top:100%"');
  expect(html).toContain('aria-label="Pin 1, damage: Back edge lifted."');
  expect(html).toContain('aria-label="Pin 2, remark: Slip of paper,"');
  expect(html.match(/pin-damage/g)).toHaveLength(1);
  expect(html).not.toContain('aspect-ratio');
  expect(words(<PinnedPhoto photo={pinned} sizes="540px" />)).toContain(
    'Back edge lifted. Open. 2 Remark: Slip of paper, as far as it goes.',
  );
});

it('hangs one photo large, two in a pair, three as one and a pair', () => {
  const group = (count: number) =>
    markup(
      <PhotoGroup photos={Array.from({ length: count }, (_, i) => photo(i + 1))} sizes={sizes} />,
    );
  expect(group(1)).not.toContain('photos-pair');
  expect(group(1)).toContain('aspect-ratio:1.6');
  expect(group(2)).toContain('photos-pair');
  expect(group(2)).not.toContain('photos-wide');
  expect(group(3).match(/photos-wide/g)).toHaveLength(1);
  expect(group(0)).toBe('');
});

it('never cuts an upright photo', () => {
  const upright = photo(1, { width: 1536, height: 2048 });
  expect(markup(<PhotoGroup photos={[upright]} sizes={sizes} />)).not.toContain('aspect-ratio');
});

it('fetches only the first photo of a page at once', () => {
  const html = markup(<PhotoGroup photos={[photo(1), photo(2)]} sizes={sizes} eager />);
  expect(html.match(/loading="lazy"/g)).toHaveLength(1);
  expect(html.match(/<img[^>]+fetchPriority="high"/gi)).toHaveLength(1);
});
