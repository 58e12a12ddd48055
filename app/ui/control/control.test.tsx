import { expect, it } from 'vitest';
import { markup, words } from '#tests/helpers/markup.tsx';
import { Notice } from '../notice.tsx';
import { Button, ButtonLink } from './button.tsx';
import { CheckField } from './check-field.tsx';
import { ChoiceField } from './choice-field.tsx';
import { ChoiceRow } from './choice-row.tsx';
import { NoteField } from './note-field.tsx';
import { FigureField, TextField } from './text-field.tsx';

it('ties label, help and error to the control', () => {
  const html = markup(
    <TextField
      id="serial"
      label="Serial"
      name="serial"
      help="As stamped."
      error="Too long. Shorten it."
    />,
  );
  expect(html).toContain('<label class="field-label" for="serial">Serial</label>');
  expect(html).toContain('aria-describedby="serial-help serial-error" aria-invalid="true"');
  expect(html).toMatch(
    /<p class="field-error" id="serial-error">.*wm-displaced.*Too long\. Shorten it\.<\/p>/,
  );
  expect(html).not.toContain('placeholder');
});

it('is not marked wrong without an error', () => {
  const html = markup(<TextField label="Serial" />);
  expect(html).not.toContain('aria-invalid');
  expect(html).not.toContain('aria-describedby');
});

it('asks for a figure with the decimal keys', () => {
  expect(markup(<FigureField label="Action, mm" />)).toContain('inputMode="decimal"');
});

it.each([
  ['several lines', <NoteField key="n" id="n" label="Note" error="Say what it shows." />],
  ['one of a list', <ChoiceField key="c" id="n" label="Kind" options={[]} error="Choose one." />],
  ['yes or no', <CheckField key="b" id="n" label="Agreed" error="Ask the owner." />],
])('marks %s the same way', (_, field) => {
  const html = markup(field);
  expect(html).toContain('aria-describedby="n-error" aria-invalid="true"');
  expect(html).toContain('for="n"');
});

it('offers a few choices as plain radio buttons with a name for the group', () => {
  const html = markup(
    <ChoiceRow
      legend="Phase"
      name="phase"
      defaultValue="during"
      options={[
        { value: 'before', label: 'Before' },
        { value: 'during', label: 'During' },
      ]}
    />,
  );
  expect(html).toContain('<legend class="sr-only">Phase</legend>');
  expect(html).toMatch(/name="phase" checked="" value="during"/);
});

it('makes buttons that send and links that look alike', () => {
  expect(markup(<Button kind="primary">Add</Button>)).toBe(
    '<button type="submit" class="btn btn-primary">Add</button>',
  );
  expect(
    markup(
      <ButtonLink to="/bench" size="big" wide>
        Back
      </ButtonLink>,
    ),
  ).toContain('class="btn btn-big w-full" href="/bench"');
});

it('says first what a notice is about, with the mark only for sealed and failed', () => {
  expect(
    words(
      <Notice tone="sealed" lead="Closed.">
        14 entries.
      </Notice>,
    ),
  ).toBe('Closed. 14 entries.');
  expect(markup(<Notice tone="sealed" lead="x" />)).toContain('wm-aligned');
  expect(markup(<Notice tone="failed" lead="x" alert />)).toMatch(/role="alert".*wm-displaced/);
  expect(markup(<Notice tone="waiting" lead="x" />)).not.toContain('wm-');
});
