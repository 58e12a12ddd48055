import { Button } from '../control/button.tsx';
import { WitnessMark } from '../mark/witness-mark.tsx';
import type { GoingUpView } from '../types.ts';
import '../add/add.css';

interface Props {
  photos: GoingUpView[];
  onRetry?: (id: string) => void;
}

/** "1 of 3 up. Keep this page open until then."; what was refused is not waited for. */
export function goingUpSentence(photos: GoingUpView[]): string {
  const up = photos.filter((photo) => photo.state === 'up').length;
  const refused = photos.filter((photo) => photo.state === 'failed' && photo.final).length;
  if (up + refused < photos.length)
    return `${up} of ${photos.length - refused} up. Keep this page open until then.`;
  if (refused > 0) return `${up} up, ${refused} did not go up.`;
  return up === 1 ? 'It is up.' : `All ${up} are up.`;
}

function Words({ photo, onRetry }: { photo: GoingUpView; onRetry?: (id: string) => void }) {
  switch (photo.state) {
    case 'up':
      return (
        <span className="inline-flex items-center justify-end gap-1.5 text-verdigris">
          <WitnessMark state="aligned" size={18} />
          Up
        </span>
      );
    case 'kept':
      return <span className="text-amber">No signal, kept</span>;
    case 'failed':
      return photo.final || !onRetry ? (
        <span className="text-madder">Did not go up</span>
      ) : (
        <Button kind="grave" size="big" type="button" onClick={() => onRetry(photo.id)}>
          Try again
        </Button>
      );
    case 'waiting':
      return <span>Waiting</span>;
    case 'going-up':
      return <span>{Math.round(photo.percent)} %</span>;
  }
}

/** Photos on their way, one row each; only what is finished or failed is read out. */
export function ProgressList({ photos, onRetry }: Props) {
  const finished = photos.filter((photo) => photo.state === 'up').map((photo) => photo.name);
  const failed = photos.filter((photo) => photo.state === 'failed').map((photo) => photo.name);
  return (
    <section className="going-up" aria-label="Photos going up">
      <p className="going-up-head">
        <b>Going up</b>
        <span>{goingUpSentence(photos)}</span>
      </p>
      <ul>
        {photos.map((photo) => (
          <li key={photo.id}>
            {photo.thumb ? (
              <img src={photo.thumb} width={48} height={42} alt="" />
            ) : (
              <span className="going-up-blank" />
            )}
            <div className="min-w-0">
              <b className="block truncate">{photo.name}</b>
              {photo.state === 'failed' ? (
                <p className="text-label text-madder">{photo.reason}</p>
              ) : (
                <div
                  className={`progress ${photo.state === 'kept' ? 'progress-kept' : ''}`}
                  role="progressbar"
                  aria-label={photo.name}
                  aria-valuemin={0}
                  aria-valuemax={100}
                  aria-valuenow={Math.round(photo.percent)}
                >
                  <span style={{ width: `${photo.percent}%` }} />
                </div>
              )}
            </div>
            <div className="going-up-words">
              <Words photo={photo} onRetry={onRetry} />
            </div>
          </li>
        ))}
      </ul>
      <p className="sr-only" aria-live="polite">
        {finished.length > 0 && `Up: ${finished.join(', ')}. `}
        {failed.length > 0 && `Did not go up: ${failed.join(', ')}.`}
      </p>
    </section>
  );
}
