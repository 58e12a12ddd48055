import { useState, type ReactNode } from 'react';
import type { FieldOf } from '#app/lib/field-of.ts';
import { Tiles, type TileView } from '#app/ui/add/tiles.tsx';
import { ChoiceRow } from '#app/ui/control/choice-row.tsx';
import { NoteField } from '#app/ui/control/note-field.tsx';
import { FigureField, TextField } from '#app/ui/control/text-field.tsx';
import { RestFields } from './rest-fields.tsx';

const PHASES = [
  { value: 'before', label: 'Before' },
  { value: 'during', label: 'During' },
  { value: 'after', label: 'After' },
];

const SEEN_BY = [
  { value: 'shared', label: 'Shared with the owner' },
  { value: 'bench', label: 'Bench only' },
];

const TILES: Omit<TileView, 'on'>[] = [
  { key: 'rest', label: 'Rest', icon: 'rest' },
  { key: 'material', label: 'Material', icon: 'pot' },
  { key: 'climate', label: 'Climate', icon: 'rule' },
  { key: 'hours', label: 'Hours', icon: 'clock' },
  { key: 'bench', label: 'Bench note', icon: 'key' },
  { key: 'when', label: 'Earlier', icon: 'note' },
];

interface Props {
  field: FieldOf;
  /** Tiles whose fields are open from the start. */
  open: string[];
  /** The front desk adds photos and notes only. */
  deskOnly: boolean;
  from: string;
  zone: string;
  /** The photos, between the note and the tiles. */
  children?: ReactNode;
}

/** What an entry says: title, note, and what else belongs to it. A tile that is off sends nothing. */
export function EntryForm({ field, open, deskOnly, from, zone, children }: Props) {
  const [on, setOn] = useState(open);
  const tiles = TILES.filter(({ key }) => !deskOnly || key === 'bench' || key === 'when');
  const toggle = (key: string) =>
    setOn(on.includes(key) ? on.filter((one) => one !== key) : [...on, key]);
  return (
    <>
      <ChoiceRow
        legend="Phase"
        name="phase"
        options={PHASES}
        defaultValue={field('phase').defaultValue}
      />
      <TextField label="Title" tall maxLength={120} {...field('draft.title')} />
      <NoteField label="Note" rows={4} {...field('draft.text')} />
      {children}
      <ChoiceRow
        legend="Who may see it"
        name="visibility"
        options={SEEN_BY}
        defaultValue={field('visibility', 'shared').defaultValue}
      />
      <Tiles
        tiles={tiles.map((tile) => ({ ...tile, on: on.includes(tile.key) }))}
        onToggle={toggle}
      />
      {on.includes('rest') && <RestFields field={field} from={from} zone={zone} />}
      {on.includes('material') && (
        <NoteField
          label="What was used"
          help="One line each: “Hot hide glue, 192 gram strength, mixed 15 April”"
          {...field('used')}
        />
      )}
      {on.includes('climate') && (
        <div className="grid grid-cols-2 gap-3">
          <FigureField label="Temperature, °C" {...field('draft.temperature')} />
          <FigureField label="Humidity, %" {...field('draft.humidity')} />
        </div>
      )}
      {on.includes('hours') && (
        <TextField label="Minutes worked" inputMode="numeric" {...field('draft.minutes')} />
      )}
      {on.includes('bench') && (
        <NoteField
          label="Bench note"
          help="Stays in the shop, also when the entry is shared."
          {...field('draft.benchNote')}
        />
      )}
      {on.includes('when') && (
        <TextField
          label="When it happened"
          help="By the shop’s clock. Empty: now."
          type="datetime-local"
          {...field('draft.occurredClock')}
        />
      )}
    </>
  );
}
