import {
  BundleEntrySchema,
  BundleFrameSchema,
  BundlePartSchema,
  BundlePhotoSchema,
  BundleStampSchema,
  LostEntrySchema,
} from '#evidence/bundle/bundle-shape.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';

type Shape = { shape: object };

/**
 * The members of a bundle that its form does not name, each as a path without numbers. A newer
 * program may have written them, so they are reported and never skipped.
 */
export function unknownMembers(bundle: JsonValue): string[] {
  const found = new Set<string>();
  const look = (value: JsonValue | undefined, { shape }: Shape, path: string) => {
    for (const name of Object.keys(value ?? {})) {
      if (!Object.hasOwn(shape, name)) found.add(path + name);
    }
  };
  const list = (value: JsonValue | undefined) => (Array.isArray(value) ? value : []);
  look(bundle, BundleFrameSchema, '');
  for (const item of list(member(bundle, 'entries'))) {
    look(item, member(item, 'entry') ? LostEntrySchema : BundleEntrySchema, 'entries.');
    const parts = member(item, 'parts');
    const names = typeof parts === 'object' && parts ? Object.values(parts) : [];
    names.forEach((part) => look(part, BundlePartSchema, 'entries.parts.'));
    list(member(item, 'photos')).forEach((p) => look(p, BundlePhotoSchema, 'entries.photos.'));
  }
  list(member(bundle, 'stamps')).forEach((s) => look(s, BundleStampSchema, 'stamps.'));
  return [...found];
}

function member(value: JsonValue | undefined, name: string): JsonValue | undefined {
  return typeof value === 'object' && value && !Array.isArray(value) ? value[name] : undefined;
}
