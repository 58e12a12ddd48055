import { act, type ReactNode } from 'react';
import { createRoot } from 'react-dom/client';
import { onTestFinished } from 'vitest';

/** Puts a component into the test's document (happy-dom) and takes it out again at its end. */
export async function mount(children: ReactNode): Promise<HTMLElement> {
  Object.assign(globalThis, { IS_REACT_ACT_ENVIRONMENT: true });
  const place = document.createElement('div');
  document.body.append(place);
  const root = createRoot(place);
  onTestFinished(async () => {
    await settled(() => root.unmount());
    place.remove();
  });
  await settled(() => root.render(children));
  return place;
}

/** Fires a bubbling event and waits until React has answered it. */
export async function fire(target: Element | null, event: Event): Promise<void> {
  await settled(() => target?.dispatchEvent(event));
}

/** Does something and waits until React has drawn what follows from it. */
export async function settled(change: () => unknown): Promise<void> {
  await act(() => Promise.resolve(void change()));
}
