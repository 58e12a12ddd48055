import { groupedDigest } from '../../lib/format/digest.ts';
import { Notice } from '../notice.tsx';
import { PinList } from '../photo/pins.tsx';
import type { ViewerPhotoView } from '../types.ts';

const phases = { before: 'Before', during: 'During', after: 'After' };
const tones = { sealed: 'sealed', open: 'plain', altered: 'failed' } as const;

interface Props {
  photo: ViewerPhotoView;
  chosen?: number;
  onChoose: (n: number | undefined) => void;
}

/** What is known about the photo in the window. */
export function ViewerSide({ photo, chosen, onChoose }: Props) {
  return (
    <aside className="viewer-side" aria-label={`Photo ${photo.n}`}>
      <h2>{photo.caption}</h2>
      <p className="-mt-2 text-ink-2">
        {phases[photo.phase]}. {photo.when}
      </p>
      {photo.pins.length > 0 && <PinList pins={photo.pins} chosen={chosen} onChoose={onChoose} />}
      <dl className="viewer-facts">
        {photo.takenBy && (
          <div>
            <dt>Taken by</dt>
            <dd>{photo.takenBy}</dd>
          </div>
        )}
        {photo.sha256 && (
          <div>
            <dt>SHA-256 of the original</dt>
            <dd>
              <code>{groupedDigest(photo.sha256)}</code>
            </dd>
          </div>
        )}
      </dl>
      <Notice tone={tones[photo.seal.state]} lead={photo.seal.lead} size={26}>
        {photo.seal.text && <span className="block">{photo.seal.text}</span>}
      </Notice>
    </aside>
  );
}
