import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { Wordmark } from '../mark/wordmark.tsx';
import pictureUrl from './picture.svg?no-inline';
import './sign-in.css';

interface Props {
  /** "Sign in", "Enter the code" */
  title: string;
  children: ReactNode;
  /** A way round, above the one to Verify: "Use another address". */
  other?: { href: string; label: string };
}

/** Spruce left of the joint, ebony right, a half-stroke of the other on each; the form beside it. */
export function SignInFrame({ title, children, other }: Props) {
  return (
    <div className="sign-in-page">
      <img className="sign-in-picture" src={pictureUrl} width={720} height={900} alt="" />
      <main className="sign-in">
        <Wordmark height={40} />
        <h1>{title}</h1>
        {children}
        <div className="sign-in-others">
          {other && <Link to={other.href}>{other.label}</Link>}
          <Link to="/verify">Check a warranty instead</Link>
        </div>
      </main>
    </div>
  );
}

/** The line between the two ways in. */
export function SignInOr() {
  return (
    <p className="sign-in-or">
      <span>or</span>
    </p>
  );
}
