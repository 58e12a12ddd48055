import {
  useEffect,
  useRef,
  useState,
  type CSSProperties,
  type KeyboardEvent,
  type ReactNode,
} from 'react';
import Lightbox, {
  type ControllerRef,
  type GenericSlide,
  type Slide,
  type ZoomRef,
} from 'yet-another-react-lightbox';
import Inline from 'yet-another-react-lightbox/plugins/inline';
import Zoom from 'yet-another-react-lightbox/plugins/zoom';
import 'yet-another-react-lightbox/styles.css';
import { Icon, type IconName } from '../icon.tsx';
import { Pins } from '../photo/pins.tsx';
import { PhotoPicture } from '../photo/photo-picture.tsx';
import type { ViewerPhotoView } from '../types.ts';
import { Film } from './film.tsx';
import { ViewerSide } from './viewer-side.tsx';
import './viewer.css';

declare module 'yet-another-react-lightbox' {
  interface SlideTypes {
    matted: MattedSlide;
  }
  interface MattedSlide extends GenericSlide {
    type: 'matted';
    photo: ViewerPhotoView;
  }
}

interface Props {
  /** "2026-031" */
  caseNumber: string;
  photos: ViewerPhotoView[];
  index: number;
  onIndex: (index: number) => void;
  onClose: () => void;
  /** "Add a pin", "Compare with after". */
  actions?: ReactNode;
}

/**
 * The photos of a case over the whole screen. Left and right step, Esc closes, + and − zoom; fingers
 * pinch. Load it lazily: nothing of it is needed to read a page.
 */
export function PhotoViewer({ caseNumber, photos, index, onIndex, onClose, actions }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const steps = useRef<ControllerRef>(null);
  const zoom = useRef<ZoomRef>(null);
  const [chosen, choose] = useState<number>();
  const photo = photos[index];

  useEffect(() => {
    if (!dialog.current?.open) dialog.current?.showModal();
  }, []);

  const goTo = (at: number) => {
    choose(undefined);
    onIndex(at);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const act = {
      ArrowLeft: () => steps.current?.prev(),
      ArrowRight: () => steps.current?.next(),
      '+': () => zoom.current?.zoomIn(),
      '=': () => zoom.current?.zoomIn(),
      '-': () => zoom.current?.zoomOut(),
    }[event.key];
    if (!act) return;
    event.preventDefault();
    event.stopPropagation();
    act();
  };

  if (!photo) return null;
  return (
    <dialog
      ref={dialog}
      className="viewer on-ebony"
      data-theme="dark"
      aria-label={`Photos of case ${caseNumber}`}
      onClose={onClose}
      onKeyDownCapture={onKeyDown}
    >
      <header className="viewer-head">
        <Key icon="close" label="Close" onClick={() => dialog.current?.close()} />
        <b>{caseNumber}</b>
        <span className="viewer-count" aria-live="polite">
          Photo {photo.n}, {index + 1} of {photos.length}
        </span>
        <Key icon="minus" label="Zoom out" onClick={() => zoom.current?.zoomOut()} />
        <Key icon="plus" label="Zoom in" onClick={() => zoom.current?.zoomIn()} />
        {actions}
      </header>
      <div className="viewer-stage">
        <Lightbox
          plugins={[Inline, Zoom]}
          inline={{ style: { width: '100%', height: '100%' } }}
          index={index}
          slides={photos.map((each): Slide => ({ type: 'matted', photo: each }))}
          carousel={{ finite: true, padding: 0, spacing: 0, preload: 1 }}
          animation={{ swipe: 220, navigation: 220, fade: 120 }}
          controller={{ ref: steps, closeOnBackdropClick: false }}
          zoom={{ ref: zoom, supports: ['matted'], maxZoom: 6, scrollToZoom: true }}
          toolbar={{ buttons: [] }}
          labels={{ Previous: 'Photo before', Next: 'Next photo' }}
          on={{ view: ({ index: at }) => at !== index && goTo(at) }}
          render={{
            iconPrev: () => <Icon name="left" size={30} />,
            iconNext: () => <Icon name="right" size={30} />,
            buttonZoom: () => null,
            slide: ({ slide, zoom: level = 1 }) =>
              slide.type === 'matted' && (
                <Matted
                  photo={slide.photo}
                  zoom={level}
                  chosen={slide.photo === photo ? chosen : undefined}
                  onChoose={choose}
                />
              ),
          }}
        />
      </div>
      <ViewerSide photo={photo} chosen={chosen} onChoose={choose} />
      <Film photos={photos} index={index} onIndex={goTo} />
    </dialog>
  );
}

function Key({ icon, label, onClick }: { icon: IconName; label: string; onClick: () => void }) {
  return (
    <button type="button" className="viewer-key" aria-label={label} onClick={onClick}>
      <Icon name={icon} size={24} />
    </button>
  );
}

interface MattedProps {
  photo: ViewerPhotoView;
  zoom: number;
  chosen?: number;
  onChoose: (n: number | undefined) => void;
}

function Matted({ photo, zoom, chosen, onChoose }: MattedProps) {
  const style = { '--shape': photo.width / photo.height, '--zoom': zoom } as CSSProperties;
  const sizes = zoom > 1 ? '2048px' : '(min-width: 56rem) calc(100vw - 500px), 100vw';
  return (
    <div className="viewer-slide" style={style}>
      <div className="mat">
        <div className="mat-window">
          <PhotoPicture photo={photo} sizes={sizes} eager />
          <Pins pins={photo.pins} chosen={chosen} onChoose={onChoose} />
        </div>
      </div>
    </div>
  );
}
