// @vitest-environment happy-dom
import { expect, it } from 'vitest';
import { fire, mount } from '#tests/helpers/mount.tsx';
import { PinnedPhoto } from './pinned-photo.tsx';

const photo = {
  id: 'one',
  n: 2,
  caption: 'Low from behind',
  alt: 'Bridge from behind',
  state: 'ready' as const,
  src320: '/320',
  src960: '/960',
  src2048: '/2048',
  width: 2048,
  height: 1536,
  pins: [
    { n: 1, kind: 'damage' as const, x: 10, y: 20, title: 'Lifted.', text: '' },
    { n: 2, kind: 'remark' as const, x: 30, y: 40, title: 'Paper.', text: '' },
  ],
};

it('outlines the line of the pin that is chosen, and the pin of the line', async () => {
  const place = await mount(<PinnedPhoto photo={photo} sizes="1px" />);
  const pressed = () =>
    [...place.querySelectorAll('button')].map((b) => b.getAttribute('aria-pressed') === 'true');
  const click = (selector: string) =>
    fire(place.querySelector(selector), new MouseEvent('click', { bubbles: true }));
  expect(pressed()).toEqual([false, false, false, false]);
  await click('.pin:nth-of-type(2)');
  expect(pressed()).toEqual([false, true, false, true]);
  await click('.pin-list li:nth-child(1) button');
  expect(pressed()).toEqual([true, false, true, false]);
  await click('.pin-list li:nth-child(1) button');
  expect(pressed()).toEqual([false, false, false, false]);
});
