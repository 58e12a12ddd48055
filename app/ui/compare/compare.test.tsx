// @vitest-environment happy-dom
import { expect, it } from 'vitest';
import { fire, mount } from '#tests/helpers/mount.tsx';
import type { PhotoView } from '../types.ts';
import { Compare } from './compare.tsx';

const photo = (id: string): PhotoView => ({
  id,
  n: 1,
  caption: '',
  alt: id,
  state: 'ready',
  src320: '/320',
  src960: '/960',
  src2048: '/2048',
  width: 2048,
  height: 1536,
  pins: [],
});

async function compare() {
  const place = await mount(
    <Compare before={photo('before')} after={photo('after')} dates="" sizes="1px" />,
  );
  const slider = place.querySelector('input') as HTMLInputElement;
  const key = (name: string) =>
    fire(slider, new KeyboardEvent('keydown', { key: name, bubbles: true, cancelable: true }));
  return { place, slider, key };
}

it('moves 2 % with each arrow and stops at the edges', async () => {
  const { slider, key } = await compare();
  expect(slider.value).toBe('50');
  await key('ArrowRight');
  expect(slider.value).toBe('52');
  for (let i = 0; i < 60; i += 1) await key('ArrowLeft');
  expect(slider.value).toBe('0');
  await key('ArrowUp');
  expect(slider.value).toBe('2');
  expect(slider.getAttribute('aria-valuetext')).toBe('2 % before');
});

it('slides fully with its two buttons, and the joint with it', async () => {
  const { place, slider } = await compare();
  const [before, after] = place.querySelectorAll('button');
  const frame = place.querySelector<HTMLElement>('.compare');
  await fire(before ?? null, new MouseEvent('click', { bubbles: true }));
  expect(slider.value).toBe('100');
  expect(frame?.style.getPropertyValue('--at')).toBe('100%');
  await fire(after ?? null, new MouseEvent('click', { bubbles: true }));
  expect(frame?.style.getPropertyValue('--at')).toBe('0%');
});
