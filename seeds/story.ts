import type { StaffViewer } from '#domain/viewer.ts';
import { setNextStep } from '#server/cases/set-next-step.ts';
import { takeIn } from '#server/cases/take-in.ts';
import { addEntry } from '#server/entries/add-entry.ts';
import { editEntry } from '#server/entries/edit-entry.ts';
import { recordAnswer } from '#server/estimates/record-answer.ts';
import { sendEstimate } from '#server/estimates/send-estimate.ts';
import { closeCase } from '#server/record/close-case.ts';
import { handBack } from '#server/record/hand-back.ts';
import { sealEntry } from '#server/record/seal-entry.ts';
import { setPins } from '#server/photos/set-pins.ts';
import { keepPicture, type Picture } from './keep-picture.ts';

/** One thing that happened in the demo, at a time. */
export interface Step {
  at: Date;
  run: () => Promise<unknown>;
}

/** What an entry of the demo says. */
export interface Words {
  phase: 'before' | 'during' | 'after';
  title: string;
  text: string;
  visibility?: 'shared' | 'bench';
  benchNote?: string;
  used?: string[];
  temperature?: string;
  humidity?: string;
  minutes?: number;
  rest?: {
    product: string;
    clampsOffHours: string | null;
    workedHours: string | null;
    stringsHours: string | null;
  };
  photos?: Picture[];
}

/** Who sealed an entry, so many minutes after it was written. */
export interface SealedBy {
  by: StaffViewer;
  minutesLater: number;
}

const later = (at: Date, minutes: number) => new Date(at.getTime() + minutes * 60_000);

/**
 * One case of the demo, told through the same operations as the screens use. What is written
 * (`writing`) and what is sealed (`sealing`) are kept apart: the photos of all cases are made ready
 * in between, and along the log time never goes back, so sealing follows the clock over all cases.
 */
export class Story {
  readonly writing: Step[] = [];
  readonly sealing: Step[] = [];
  /** "2026-031", from the moment it is taken in. */
  number = '';

  #write(at: Date, run: Step['run']): void {
    this.writing.push({ at, run });
  }

  #seal(at: Date, run: Step['run']): void {
    this.sealing.push({ at, run });
  }

  #form({ phase, visibility = 'shared', photos = [], ...draft }: Words, photoIds: string[]) {
    return {
      caseNumber: this.number,
      phase,
      visibility,
      draft: { benchNote: '', used: [], ...draft },
      photos: photos.map(({ caption }, i) => ({
        photoId: photoIds[i],
        caption,
        visibility,
      })),
    };
  }

  async #pins(entryId: string, photos: Picture[], ids: string[], by: StaffViewer): Promise<void> {
    for (const [i, { pins }] of photos.entries()) {
      const photoId = ids[i];
      if (pins && photoId) await setPins(by, { caseNumber: this.number, entryId, photoId, pins });
    }
  }

  async #photos(photos: Picture[], by: StaffViewer, at: Date): Promise<string[]> {
    const ids: string[] = [];
    for (const picture of photos) ids.push(await keepPicture(by, this.number, picture, at));
    return ids;
  }

  /** Takes the instrument in; the entry that taking in begins is given `words` and sealed. */
  takenIn(
    at: Date,
    by: StaffViewer,
    form: Record<string, unknown>,
    words: Words,
    seal: SealedBy | null,
    series: number,
  ): this {
    let entryId = '';
    this.#write(at, async () => {
      ({ number: this.number, entryId } = await takeIn(by, form, { now: at, series }));
      const ids = await this.#photos(words.photos ?? [], by, at);
      await editEntry(by, { ...this.#form(words, ids), entryId, takeOff: [] }, { now: at });
      await this.#pins(entryId, words.photos ?? [], ids, by);
    });
    if (seal) this.#sealed(at, () => entryId, seal);
    return this;
  }

  /** Adds an entry, sealed unless `seal` is null. */
  entry(at: Date, by: StaffViewer, words: Words, seal: SealedBy | null): this {
    let entryId = '';
    this.#write(at, async () => {
      const ids = await this.#photos(words.photos ?? [], by, at);
      ({ entryId } = await addEntry(by, this.#form(words, ids), { now: at }));
      await this.#pins(entryId, words.photos ?? [], ids, by);
    });
    if (seal) this.#sealed(at, () => entryId, seal);
    return this;
  }

  #sealed(at: Date, entryId: () => string, { by, minutesLater }: SealedBy): void {
    const now = later(at, minutesLater);
    this.#seal(now, () => sealEntry(by, { caseNumber: this.number, entryId: entryId() }, { now }));
  }

  /** Sends an estimate; the case waits for the owner. */
  estimate(at: Date, by: StaffViewer, summary: string, total: string): this {
    this.#write(at, () =>
      sendEstimate(by, { caseNumber: this.number, summary, total }, { now: at }),
    );
    return this;
  }

  /** Records at the desk that the owner authorised the estimate. */
  authorised(at: Date, by: StaffViewer): this {
    this.#seal(at, () =>
      recordAnswer(
        by,
        { caseNumber: this.number, answer: 'authorised', revision: '1' },
        { now: at },
      ),
    );
    return this;
  }

  /** Says what is to be done next, by whom, and where the instrument hangs. */
  next(at: Date, by: StaffViewer, nextStep: string, place = ''): this {
    const { personId: technicianId } = by;
    this.#write(at, () =>
      setNextStep(by, { caseNumber: this.number, nextStep, technicianId, place }),
    );
    return this;
  }

  /** Closes the case. */
  closed(at: Date, by: StaffViewer): this {
    this.#seal(at, () => closeCase(by, { caseNumber: this.number }, { now: at }));
    return this;
  }

  /** Hands the instrument back. */
  handedBack(at: Date, by: StaffViewer): this {
    this.#seal(at, () => handBack(by, { caseNumber: this.number }, { now: at }));
    return this;
  }

  /** Anything else that is sealed in this case at that time. */
  then(at: Date, run: (caseNumber: string) => Promise<unknown>): this {
    this.#seal(at, () => run(this.number));
    return this;
  }
}
