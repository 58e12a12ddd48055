import type { StandingView } from '../types.ts';
import './verify.css';
import '../tag/tag.css';

/** What the warranty is now: the shop's word, as large as the verdict, on the shop's tag. */
export function Standing({ standing }: { standing: StandingView }) {
  const off = standing.word !== 'In force';
  return (
    <section
      className={`standing tag-paper tag-side ${off ? 'standing-off' : ''}`}
      aria-label="Standing"
    >
      <span className="eyelet" aria-hidden />
      <div className="standing-word">
        <p className="small-label">{standing.label ?? 'Standing, the shop’s word'}</p>
        <p>{standing.word}</p>
      </div>
      <p className="standing-date">
        {standing.date}
        <small>{standing.small}</small>
      </p>
    </section>
  );
}
