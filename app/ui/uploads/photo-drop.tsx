import { useEffect, useMemo, useRef, useSyncExternalStore } from 'react';
import { useDropzone } from 'react-dropzone';
import { useLocation } from 'react-router';
import { pageQueue } from '#app/lib/uploads/page-queue.ts';
import { useGoingUp } from '#app/lib/uploads/use-going-up.ts';
import { useThumbs } from '#app/lib/uploads/use-thumbs.ts';
import { Button } from '../control/button.tsx';
import { DropArea } from '../drop-area.tsx';
import { ProgressList } from '../going-up/progress-list.tsx';
import type { GoingUpView } from '../types.ts';

// By ending too: some systems know no type for HEIC.
const ACCEPT = 'image/jpeg,image/png,image/webp,image/heic,image/heif,.heic,.heif';

const WHAT = 'JPEG, PNG, WebP or HEIC, up to 50 MB each.';

const nothing = () => () => undefined;
const useHydrated = () =>
  useSyncExternalStore(
    nothing,
    () => true,
    () => false,
  );

interface Props {
  caseNumber: string;
  /** The draft the photos are for; it need not be written yet. */
  entryId: string;
  /** Told of every change: ids, names, how far each has come. */
  onPhotos?: (photos: GoingUpView[]) => void;
}

/**
 * Adds photos to an entry: by camera, by choosing, by dropping, many at once, each with its progress.
 * Before the page's program has come it is a plain form that sends the files.
 */
export function PhotoDrop({ caseNumber, entryId, onPhotos }: Props) {
  const hydrated = useHydrated();
  const { pathname, search } = useLocation();
  const camera = useRef<HTMLInputElement>(null);
  const goingUp = useGoingUp(entryId);
  const thumbs = useThumbs(goingUp);
  const add = (files: readonly File[]) => void pageQueue().add(files, { caseNumber, entryId });
  const { getRootProps, getInputProps, isDragActive, open, inputRef } = useDropzone({
    noClick: true,
    noKeyboard: true,
    onDrop: add,
  });

  const lookedForEarly = useRef(false);
  useEffect(() => {
    if (lookedForEarly.current) return;
    lookedForEarly.current = true;
    // Chosen before the program had come.
    const early = [...(inputRef.current?.files ?? [])];
    if (early.length > 0) void pageQueue().add(early, { caseNumber, entryId });
  }, [inputRef, caseNumber, entryId]);

  const photos = useMemo<GoingUpView[]>(
    () =>
      goingUp.map(({ id, name, percent, state, reason, final, file }) => ({
        ...{ id, name, percent, state, reason, final },
        thumb: thumbs.get(file),
      })),
    [goingUp, thumbs],
  );
  const tell = useRef(onPhotos);
  useEffect(() => {
    tell.current = onPhotos;
  });
  useEffect(() => tell.current?.(photos), [photos]);

  const query = new URLSearchParams({ entry: entryId, back: pathname + search });
  return (
    <div {...getRootProps({ role: undefined })} className="grid gap-3 p-3.5">
      <form
        method="post"
        encType="multipart/form-data"
        action={`/api/cases/${caseNumber}/photos/form?${query}`}
      >
        <input
          {...getInputProps({
            name: 'photos',
            accept: ACCEPT,
            multiple: true,
            'aria-label': 'Choose photos',
            className: hydrated ? 'sr-only' : 'mb-3 block w-full',
            // The buttons open it then.
            tabIndex: hydrated ? -1 : 0,
            'aria-hidden': hydrated,
            style: {},
          })}
        />
        {hydrated ? (
          <>
            <div className="grid grid-cols-2 gap-2 phone:hidden">
              <Button
                size="big"
                type="button"
                icon="camera"
                onClick={() => camera.current?.click()}
              >
                Take a photo
              </Button>
              <Button size="big" type="button" onClick={open}>
                Choose photos
              </Button>
            </div>
            <DropArea
              icon="camera"
              title="Drop photos here"
              sub={WHAT}
              over={isDragActive}
              className="py-3 max-phone:hidden"
            >
              <Button size="tall" type="button" className="ml-auto shrink-0" onClick={open}>
                Choose photos
              </Button>
            </DropArea>
          </>
        ) : (
          <div className="flex flex-wrap items-center justify-between gap-3">
            <span className="text-label text-ink-2">{WHAT}</span>
            <Button size="big">Send the photos</Button>
          </div>
        )}
      </form>
      <input
        ref={camera}
        type="file"
        accept="image/*"
        capture="environment"
        className="sr-only"
        tabIndex={-1}
        aria-hidden
        onChange={({ target }) => {
          add([...(target.files ?? [])]);
          target.value = '';
        }}
      />
      {photos.length > 0 && (
        <ProgressList photos={photos} onRetry={(id) => pageQueue().retry(id)} />
      )}
    </div>
  );
}
