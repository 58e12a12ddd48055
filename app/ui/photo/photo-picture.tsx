import type { PhotoView } from '../types.ts';

interface Props {
  photo: PhotoView;
  /** How wide it is shown, as in the HTML attribute. */
  sizes: string;
  /** Width : height of the window; without it the photo keeps its own shape and nothing is cut off. */
  shape?: number;
  /** The first photo of a page: fetched at once and before the others. */
  eager?: boolean;
}

/** The three sizes with the widths they really have, none of them wider than the photo. */
export function srcSet({ width, height, src320, src960, src2048 }: PhotoView): string {
  const long = Math.max(width, height);
  return [
    { src: src320, edge: 320 },
    { src: src960, edge: 960 },
    { src: src2048, edge: 2048 },
  ]
    .map(({ src, edge }) => `${src} ${Math.round((Math.min(edge, long) * width) / long)}w`)
    .join(', ');
}

/** The picture alone; its place is kept free before it is there. */
export function PhotoPicture({ photo, sizes, shape, eager }: Props) {
  return (
    <img
      src={photo.src960}
      srcSet={srcSet(photo)}
      sizes={sizes}
      width={photo.width}
      height={photo.height}
      alt={photo.alt}
      loading={eager ? undefined : 'lazy'}
      fetchPriority={eager ? 'high' : undefined}
      decoding="async"
      style={{
        aspectRatio: shape,
        backgroundImage: photo.placeholder && `url(${photo.placeholder})`,
      }}
    />
  );
}
