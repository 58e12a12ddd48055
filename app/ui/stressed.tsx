/** A sentence of which one part is printed heavier. */
export function Stressed({ sentence, stress }: { sentence: string; stress?: string }) {
  const at = stress ? sentence.indexOf(stress) : -1;
  if (!stress || at < 0) return sentence;
  return (
    <>
      {sentence.slice(0, at)}
      <b>{stress}</b>
      {sentence.slice(at + stress.length)}
    </>
  );
}
