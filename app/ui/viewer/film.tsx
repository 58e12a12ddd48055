import type { Phase, ViewerPhotoView } from '../types.ts';

const phases: { phase: Phase; name: string }[] = [
  { phase: 'before', name: 'Before' },
  { phase: 'during', name: 'During' },
  { phase: 'after', name: 'After' },
];

interface Props {
  photos: ViewerPhotoView[];
  index: number;
  onIndex: (index: number) => void;
}

/** All photos of the case by phase. */
export function Film({ photos, index, onIndex }: Props) {
  return (
    <nav className="viewer-film" aria-label="All photos">
      {phases.map(({ phase, name }) => {
        const own = photos.flatMap((photo, at) => (photo.phase === phase ? [{ photo, at }] : []));
        return (
          <section key={phase}>
            <h3>{name}</h3>
            {own.length === 0 && <p className="py-3.5 text-ink-3">Nothing here yet.</p>}
            <ul>
              {own.map(({ photo, at }) => (
                <li key={photo.id}>
                  <button
                    type="button"
                    aria-label={`Photo ${photo.n}: ${photo.caption}`}
                    aria-current={at === index ? 'true' : undefined}
                    onClick={() => onIndex(at)}
                  >
                    <img
                      src={photo.src320}
                      width={88}
                      height={62}
                      alt=""
                      loading="lazy"
                      style={{
                        backgroundImage: photo.placeholder && `url(${photo.placeholder})`,
                      }}
                    />
                  </button>
                </li>
              ))}
            </ul>
          </section>
        );
      })}
    </nav>
  );
}
