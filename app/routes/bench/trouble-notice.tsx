import { Notice } from '#app/ui/notice.tsx';

/** What fails behind the scenes: mail that does not go out, a photo that could not be prepared. */
export function TroubleNotice({ sentences }: { sentences: string[] }) {
  const [first, ...others] = [...new Set(sentences)];
  if (first === undefined) return null;
  return (
    <Notice tone="waiting" icon="off" lead={first} className="my-4">
      {others.join(' ')}
    </Notice>
  );
}
