import { useDropzone } from 'react-dropzone';
import { DropArea } from '#app/ui/drop-area.tsx';
import type { HeldPaper } from './held-paper.ts';

interface Props {
  /** The file in hand. */
  name: string | null;
  onPaper: (paper: HeldPaper) => void;
  big?: boolean;
}

/** The place to drop a paper on. The file is read here and not sent. */
export function PaperDrop({ name, onPaper, big = false }: Props) {
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
  return (
    <DropArea
      {...getRootProps()}
      title={name ?? 'Drop the PDF here'}
      sub="checked here, not sent"
      over={isDragActive}
      className={big ? 'min-h-26' : ''}
    >
      <input {...getInputProps()} aria-label="The PDF of the warranty" />
      <button type="button" className="link ml-auto min-h-11 whitespace-nowrap" onClick={open}>
        {name === null ? 'Choose a file' : 'Check another'}
      </button>
    </DropArea>
  );
}
