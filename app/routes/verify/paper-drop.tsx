import { useSyncExternalStore } from 'react';
import { useDropzone } from 'react-dropzone';
import { Button } from '#app/ui/control/button.tsx';
import { DropArea } from '#app/ui/drop-area.tsx';
import type { HeldPaper } from './held-paper.ts';

/** Whether a script runs does not change while the page is open. */
const nothingChanges = () => () => undefined;

interface Props {
  /** The file in hand. */
  name: string | null;
  onPaper: (paper: HeldPaper) => void;
  big?: boolean;
}

/** The place to drop a paper on. The file is read here and not sent. */
export function PaperDrop({ name, onPaper, big = false }: Props) {
  const ready = useSyncExternalStore(
    nothingChanges,
    () => true,
    () => false,
  );
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    multiple: false,
    noClick: true,
    noKeyboard: true,
    onDrop: (files) => {
      const [file] = files;
      if (!file) return;
      void file.arrayBuffer().then((buffer) => {
        onPaper({ name: file.name, bytes: new Uint8Array(buffer) });
      });
    },
  });
  const className = big ? 'min-h-26' : '';
  if (!ready) {
    return (
      <DropArea
        title="The PDF can be checked here too"
        sub="that needs JavaScript: the file is read in your browser and not sent"
        className={className}
      />
    );
  }
  return (
    <DropArea
      {...getRootProps()}
      title={name ?? 'Drop the PDF here'}
      sub="checked here, not sent"
      over={isDragActive}
      className={className}
    >
      <input {...getInputProps()} aria-label="The PDF of the warranty" />
      <span className="ml-auto whitespace-nowrap">
        <Button kind="text" type="button" onClick={open}>
          {name === null ? 'Choose a file' : 'Check another'}
        </Button>
      </span>
    </DropArea>
  );
}
