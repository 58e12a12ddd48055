import { Form } from 'react-router';
import { counted } from '#app/lib/format/number.ts';
import { useChanges } from '#app/lib/use-changes.ts';
import { Button, ButtonLink } from '#app/ui/control/button.tsx';
import { WitnessMark } from '#app/ui/mark/witness-mark.tsx';

interface Props {
  title: string;
  shared: boolean;
  photos: number;
  /** Photos that are not up yet: it cannot be sealed. */
  missing: number;
  /** Photos whose sizes are being made: it can be sealed in a moment. */
  preparing: number;
  /** What to watch, so that the page goes on by itself. */
  changes: { case: string; version: string };
  back: string;
}

/** Asks once before an entry is sealed: it cannot be taken back. */
export function SealAsk(props: Props) {
  const { title, shared, photos, missing, preparing, changes, back } = props;
  useChanges(changes);
  return (
    <Form method="post" className="grid gap-5 p-5">
      <WitnessMark state="hollow" size={120} className="mx-auto my-4 text-ink-2" />
      <h2 className="text-h2">Seal “{title}”?</h2>
      <p className="text-note">
        {photos === 0 ? 'It has no photos.' : `It has ${counted(photos, 'photo', 'photos')}.`} After
        this nothing of it can be altered; corrections are added beside it.
      </p>
      <p className="text-note">
        {shared
          ? 'The owner sees it in the portal and is told by e-mail. Photos marked bench only stay in the shop.'
          : 'It stays in the shop: the owner does not see it.'}
      </p>
      {preparing > 0 && (
        <p className="font-semibold text-amber">
          {counted(preparing, 'photo is', 'photos are')} still being prepared. Wait a moment.
        </p>
      )}
      {missing > 0 && (
        <p className="font-semibold text-amber">
          {counted(missing, 'photo', 'photos')} still to come up. Wait, or take them off the entry.
        </p>
      )}
      <div className="grid gap-3">
        <Button
          kind="primary"
          size="big"
          name="intent"
          value="seal"
          disabled={missing > 0 || preparing > 0}
          wide
        >
          Seal it
        </Button>
        <ButtonLink to={back} size="tall" wide>
          Not yet
        </ButtonLink>
      </div>
    </Form>
  );
}
