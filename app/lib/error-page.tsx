import { Link } from 'react-router';
import { Wordmark } from '#app/ui/mark/wordmark.tsx';
import { Notice } from '#app/ui/notice.tsx';
import { problemOf } from './problem-of.ts';

const TITLES: Record<number, string> = {
  403: 'Not for your role',
  404: 'Nothing here',
  405: 'Not possible here',
  503: 'Something does not answer',
};

/** The whole page, when nothing else can be shown: what is wrong, then what to do. */
export function ErrorPage({ error }: { error: unknown }) {
  const { status, sentence } = problemOf(error);
  const title = TITLES[status] ?? 'Something broke';
  return (
    <main className="mx-auto grid max-w-[40rem] gap-6 px-6 py-12">
      <title>{`${title} · Witnessmark`}</title>
      <Link to="/" className="text-ink">
        <Wordmark height={40} />
      </Link>
      <h1>{title}</h1>
      <Notice tone={status === 404 ? 'plain' : 'failed'} lead={sentence} />
      <p>
        <Link to="/">Go to your first page</Link>
      </p>
    </main>
  );
}
