import type { GoingUpView } from '../types.ts';
import './add.css';

const words: Record<GoingUpView['state'], (photo: GoingUpView) => string> = {
  waiting: () => 'waiting',
  'going-up': (photo) => `${Math.round(photo.percent)}\u00a0%`,
  up: () => 'up',
  kept: () => 'kept',
  failed: () => 'did not go up',
};

/** The photos that the note is about. */
export function PhotoStrip({ photos }: { photos: GoingUpView[] }) {
  return (
    <ul className="photo-strip">
      {photos.map((photo) => (
        <li key={photo.id}>
          {photo.thumb && <img src={photo.thumb} width={120} height={76} alt="" />}
          {photo.name}, {words[photo.state](photo)}
        </li>
      ))}
    </ul>
  );
}
