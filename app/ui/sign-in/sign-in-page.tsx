import type { ReactNode } from 'react';
import { Wordmark } from '../mark/wordmark.tsx';
import pictureUrl from './picture.svg?no-inline';

interface Props {
  /** "Sign in", "Enter the code" */
  title: string;
  /** Form and ways round it. */
  children: ReactNode;
}

/** Spruce left of the joint, ebony right, a half-stroke of the other on each; the form beside it. */
export function SignInPage({ title, children }: Props) {
  return (
    <div className="sign-in-page">
      <img className="sign-in-picture" src={pictureUrl} width={720} height={900} alt="" />
      <main className="sign-in">
        <Wordmark height={46} />
        <h1>{title}</h1>
        {children}
      </main>
    </div>
  );
}

/** The line between the two ways in. */
export function Or() {
  return (
    <p className="sign-in-or">
      <span>or</span>
    </p>
  );
}
