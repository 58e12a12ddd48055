import { expect, it } from 'vitest';
import { themeOf } from '../bar/theme.ts';
import { PortalTabs } from '../bar/portal-tabs.tsx';
import { Compare } from '../compare/compare.tsx';
import { Stressed } from '../stressed.tsx';
import type { PhotoView } from '../types.ts';
import { markup, words } from '#tests/helpers/markup.tsx';
import { CaseLink } from './case-link.tsx';
import { PortalNow } from './portal-now.tsx';

const photo = (alt: string): PhotoView => ({
  id: alt,
  n: 1,
  caption: '',
  alt,
  state: 'ready',
  src320: '/320',
  src960: '/960',
  src2048: '/2048',
  width: 2048,
  height: 1536,
  pins: [],
});

it('says where an instrument is in one word and one sentence', () => {
  const now = {
    state: 'Resting',
    tone: 'waiting' as const,
    sentence: 'They come off on Thursday at 09:40.',
    stress: 'Thursday at 09:40',
    rows: [{ label: 'May be ready', value: 'Friday 24 April' }],
  };
  expect(words(<PortalNow now={now} />)).toBe(
    'Resting They come off on Thursday at 09:40 . May be ready Friday 24 April',
  );
  expect(markup(<PortalNow now={now} />)).toContain('<b>Thursday at 09:40</b>');
});

it('leaves a sentence alone when the part is not in it', () => {
  expect(markup(<Stressed sentence="On the bench." stress="Friday" />)).toBe('On the bench.');
});

it('links each instrument as a whole', () => {
  const html = markup(
    <CaseLink
      item={{
        href: '/portal/cases/2026-031',
        instrument: 'Parlour guitar',
        number: '2026-031',
        state: 'Resting',
        tone: 'waiting',
        sentence: 'Clamps off Thu, 09:40.',
      }}
    />,
  );
  expect(html.startsWith('<a class="panel case-link" href="/portal/cases/2026-031"')).toBe(true);
});

it('names the tab one is on', () => {
  const html = markup(
    <PortalTabs
      tabs={[
        { label: 'Now', href: '/a', current: true },
        { label: 'Timeline', href: '/b' },
      ]}
    />,
  );
  expect(html).toContain('<nav class="portal-tabs" aria-label="Portal">');
  expect(html.match(/aria-current="page"/g)).toHaveLength(1);
});

it('slides between before and after with a real slider and two buttons', () => {
  const html = markup(
    <Compare
      before={photo('Gap under the bridge')}
      after={photo('Bridge down')}
      dates="Left 31 March, right 22 April."
      sizes="1px"
    />,
  );
  expect(html).toContain('type="range"');
  expect(html).toContain('aria-label="Slide between before and after"');
  expect(html).toContain('alt="Gap under the bridge"');
  expect(html).toContain('alt="Bridge down"');
  expect(html.match(/<button type="button"/g)).toHaveLength(2);
});

it('reads the forced theme from the cookies', () => {
  expect(themeOf('a=1; theme=dark; b=2')).toBe('dark');
  expect(themeOf('theme=light')).toBe('light');
  expect(themeOf('mytheme=dark')).toBe('device');
  expect(themeOf('theme=purple')).toBe('device');
  expect(themeOf(null)).toBe('device');
});
