import { freq, midi } from '@tonaljs/note';
import { describe, expect, it } from 'vitest';
import { fretPosition } from '#domain/bench/fret-positions.ts';
import { centsBetween, noteFrequency, noteNumber } from '#domain/bench/pitch.ts';
import { casesOf, expectCase, expectNear, type Inputs, readCases } from './bench-cases.ts';

const cases = readCases('bench-pitch');

describe('pitch of a note', () => {
  it.each(casesOf(cases, 'pitch.frequency', 10))('$id', (one) => {
    const { midi: note = NaN, a4_hz } = one.inputs as Inputs;
    expect(noteNumber(one.inputs['note'] as string)).toBe(note);
    const frequency_hz = noteFrequency(note, a4_hz);
    expectCase(one, { frequency_hz }, { abs: one.tolerance['abs_hz'] });
  });

  it('agrees with a music theory library for every note and spelling', () => {
    // Second reference: npm @tonaljs/note, A4 = 440 Hz.
    for (const letter of ['C', 'C#', 'Db', 'D', 'Eb', 'E', 'F', 'F#', 'G', 'Ab', 'A', 'Bb', 'B']) {
      for (let octave = 0; octave <= 8; octave += 1) {
        const name = `${letter}${octave}`;
        expect(noteNumber(name), name).toBe(midi(name));
        expectNear(noteFrequency(noteNumber(name)), freq(name) ?? NaN, { rel: 1e-12 });
      }
    }
  });
});

describe('cents between two pitches', () => {
  it.each(casesOf(cases, 'pitch.cents', 6))('$id', (one) => {
    const { reference_hz = NaN, measured_hz = NaN } = one.inputs as Inputs;
    const cents = centsBetween(reference_hz, measured_hz);
    expectCase(one, { cents }, { abs: one.tolerance['abs_cents'] });
  });
});

describe('fret positions', () => {
  it.each(casesOf(cases, 'fret.position', 12))('$id', (one) => {
    const { scale_mm = NaN, fret = NaN } = one.inputs as Inputs;
    const nut_to_fret_mm = fretPosition(scale_mm, fret);
    expectCase(one, { nut_to_fret_mm }, { abs: one.tolerance['abs_mm'] });
  });

  it('come out the same by taking 1/17.81715 of the rest again and again', () => {
    // The trade's own rule, with its printed constant (common practice).
    let rest = 647.7;
    for (let fret = 1; fret <= 24; fret += 1) {
      rest -= rest / 17.81715;
      expectNear(fretPosition(647.7, fret), 647.7 - rest, { abs: 0.0005 });
    }
  });
});
