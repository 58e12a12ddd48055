import { WitnessMark } from '../mark/witness-mark.tsx';

/** "Closed and sealed 24 April, 16:05, by Ines Lund", and what that covers. */
export function SealedBanner({ lead, text }: { lead: string; text: string }) {
  return (
    <section className="sealed-banner" aria-label="Closed">
      <WitnessMark state="aligned" size={38} />
      <p>
        <b>{lead}</b>
        {text}
      </p>
    </section>
  );
}
