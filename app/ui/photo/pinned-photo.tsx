import { useState } from 'react';
import type { PhotoView } from '../types.ts';
import { Mat } from './mat.tsx';
import { PinList, Pins } from './pins.tsx';

interface Props {
  photo: PhotoView;
  sizes: string;
  eager?: boolean;
  className?: string;
}

/** A photo with pins and their lines. It keeps its own shape: a pin's place is a place on the whole photo. */
export function PinnedPhoto({ photo, sizes, eager, className }: Props) {
  const [chosen, choose] = useState<number>();
  const pins = { pins: photo.pins, chosen, onChoose: choose };
  return (
    <>
      <Mat photo={photo} sizes={sizes} eager={eager} className={className}>
        <Pins {...pins} />
      </Mat>
      <PinList {...pins} />
    </>
  );
}
