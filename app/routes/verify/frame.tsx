import type { ReactNode } from 'react';
import { PublicBar } from '#app/ui/bar/public-bar.tsx';

/** Around the pages that anyone may open. */
export function PublicFrame({
  current,
  children,
}: {
  current?: 'what-is-checked' | 'log';
  children: ReactNode;
}) {
  const links = [
    {
      label: 'What is checked',
      href: '/verify/what-is-checked',
      current: current === 'what-is-checked',
    },
    { label: 'The log', href: '/log', current: current === 'log' },
    { label: 'Sign in', href: '/sign-in' },
  ];
  return (
    <>
      <PublicBar home="/verify" links={links} />
      {children}
    </>
  );
}
