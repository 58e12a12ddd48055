// @vitest-environment happy-dom
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { fire, mount, settled } from '#tests/helpers/mount.tsx';
import { Toast } from './toast.tsx';

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

const pass = (ms: number) => settled(() => vi.advanceTimersByTime(ms));

it('goes after eight seconds', async () => {
  const close = vi.fn();
  await mount(
    <Toast state="hollow" onClose={close}>
      Entry added. Not yet sealed.
    </Toast>,
  );
  await pass(7_999);
  expect(close).not.toHaveBeenCalled();
  await pass(1);
  expect(close).toHaveBeenCalledOnce();
});

it('stays while it has the focus', async () => {
  const close = vi.fn();
  const place = await mount(
    <Toast state="hollow" onClose={close} action={<button type="button">Seal it</button>}>
      Entry added. Not yet sealed.
    </Toast>,
  );
  await pass(5_000);
  await fire(place.querySelector('button'), new FocusEvent('focusin', { bubbles: true }));
  await pass(60_000);
  expect(close).not.toHaveBeenCalled();
  await fire(place.querySelector('button'), new FocusEvent('focusout', { bubbles: true }));
  await pass(8_000);
  expect(close).toHaveBeenCalledOnce();
});
