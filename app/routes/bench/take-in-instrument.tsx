import { useState } from 'react';
import type { FieldOf } from '#app/lib/field-of.ts';
import { ChoiceField } from '#app/ui/control/choice-field.tsx';
import { NoteField } from '#app/ui/control/note-field.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import { Notice } from '#app/ui/notice.tsx';
import { INSTRUMENT_KINDS, instrumentKind } from '#domain/instrument-kinds.ts';
import { FieldRow, FormSection } from './form-section.tsx';

/** An instrument of the owner that was here before, with its cases in words. */
export interface KnownInstrumentView {
  id: string;
  /** "Parlour guitar, Aldous Pike, 0417" */
  name: string;
  /** "2025-014, new saddle, 3 March 2025" */
  cases: string[];
}

const KINDS = [
  { value: '', label: 'Choose the kind' },
  ...INSTRUMENT_KINDS.map(({ name }) => ({ value: name, label: name })),
];

interface Props {
  known: KnownInstrumentView[];
  /** Its id when one is chosen already. */
  chosen: string;
  serial: string;
  /** The serial that was looked up is on record with somebody else. */
  asksForProof: boolean;
  currency: string;
  field: FieldOf;
}

/** The instrument: one of the owner's known ones, or written down. */
export function InstrumentSection(props: Props) {
  const { known, chosen, serial, asksForProof, currency, field } = props;
  const [choice, setChoice] = useState(chosen);
  const error = field('instrument').error;
  return (
    <FormSection title="Instrument" sub="What stands on its label, as it is read.">
      {asksForProof && (
        <Notice tone="waiting" lead="Proof will be asked for." icon="key">
          This serial is on record with another person. The case waits until papers are recorded or
          the owner of record confirms.
        </Notice>
      )}
      {known.length > 0 && (
        <fieldset className="grid gap-2">
          <legend className="mb-2 font-semibold">Which of theirs is it?</legend>
          {[...known, { id: '', name: 'Another instrument', cases: [] }].map((one) => (
            <label key={one.id} className="panel flex min-h-14 gap-3 px-4 py-3">
              <input
                type="radio"
                name="instrument.id"
                value={one.id}
                defaultChecked={one.id === chosen}
                onChange={() => setChoice(one.id)}
                className="mt-1"
              />
              <span>
                <b>{one.name}</b>
                {one.cases.map((line) => (
                  <span key={line} className="block text-label text-ink-2">
                    {line}
                  </span>
                ))}
              </span>
            </label>
          ))}
          {error && <p className="field-error">{error}</p>}
        </fieldset>
      )}
      {choice === '' && <NewInstrument serial={serial} currency={currency} field={field} />}
    </FormSection>
  );
}

function NewInstrument({ serial, currency, field }: Pick<Props, 'serial' | 'currency' | 'field'>) {
  const [kind, setKind] = useState(field('instrument.kind').defaultValue);
  const photoList = instrumentKind(kind)?.photoList;
  return (
    <>
      <FieldRow>
        <ChoiceField
          label="Kind"
          options={KINDS}
          {...field('instrument.kind')}
          onChange={(event) => setKind(event.currentTarget.value)}
        />
        <TextField label="Maker" help="“Unknown” if nothing says." {...field('instrument.maker')} />
      </FieldRow>
      <FieldRow>
        <TextField label="Serial" mono {...field('instrument.serial', serial)} />
        <TextField label="Model" {...field('instrument.model')} />
      </FieldRow>
      {photoList && (
        <p className="text-label text-ink-2">
          Photos to take before anything is touched: {photoList.join(', ').toLowerCase()}.
        </p>
      )}
      <details>
        <summary className="min-h-11 py-2 font-semibold">More about it</summary>
        <div className="grid gap-5 pt-2">
          <FieldRow>
            <TextField label="Year" {...field('instrument.year')} />
            <TextField label="Finish" {...field('instrument.finish')} />
          </FieldRow>
          <FieldRow>
            <TextField label="Strings fitted" {...field('instrument.strings')} />
            <TextField label="Tuning" {...field('instrument.tuning')} />
          </FieldRow>
          <FieldRow>
            <TextField
              label="Woods"
              help="Rosewood, ivory or tortoiseshell: ask about permits before it crosses a border."
              {...field('instrument.woods')}
            />
            <TextField
              label={`Declared value, ${currency}`}
              inputMode="decimal"
              {...field('instrument.declaredValue')}
            />
          </FieldRow>
          <NoteField label="Distinguishing marks" {...field('instrument.marks')} />
        </div>
      </details>
    </>
  );
}
