import type { FieldOf } from '#app/lib/field-of.ts';
import { CheckField } from '#app/ui/control/check-field.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import type { NamedPhoto } from './named-photos.ts';

/** What each photo shows, and who may see it. */
export function PhotoWords({ photos, field }: { photos: NamedPhoto[]; field: FieldOf }) {
  if (photos.length === 0) return null;
  return (
    <fieldset className="grid gap-4">
      <legend className="mb-2 font-semibold">What each photo shows</legend>
      {photos.map((photo, index) => (
        <div key={photo.id} className="grid grid-cols-[4.5rem_minmax(0,1fr)] items-start gap-3">
          <input type="hidden" name={`photos.${index}.photoId`} value={photo.id} />
          <span className="mat mat-small mt-7">
            <span className="mat-window">
              {photo.thumb ? (
                <img src={photo.thumb} width={72} height={54} alt="" />
              ) : (
                <span className="mat-empty" />
              )}
            </span>
          </span>
          <div className="grid gap-2">
            <TextField
              label={`${photo.name} shows`}
              help={index === 0 ? 'What is to be seen and where.' : undefined}
              maxLength={400}
              {...field(`photos.${index}.caption`, photo.caption)}
            />
            <div className="flex flex-wrap gap-x-6">
              <CheckField
                label="Bench only"
                name={`photos.${index}.bench`}
                defaultChecked={photo.bench || field(`photos.${index}.bench`).defaultValue === 'on'}
              />
              {photo.leaveOut && (
                <CheckField label={photo.leaveOut} name="takeOff" value={photo.id} />
              )}
            </div>
          </div>
        </div>
      ))}
    </fieldset>
  );
}
