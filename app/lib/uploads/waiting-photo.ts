/** Where a photo is to go. */
export interface PhotoTarget {
  caseNumber: string;
  /** The draft it is for, also one that is not written yet. */
  entryId: string;
}

/** A photo that has not gone up yet, as a shelf keeps it. */
export interface WaitingPhoto extends PhotoTarget {
  /** UUIDv7: sending again under the same id is the same photo. */
  id: string;
  file: Blob;
  /** The file's name on this device. */
  name: string;
}

/**
 * Where photos wait until they are up. Everything is asynchronous, so that a shelf may outlast the
 * page (a database of the browser) or not (a Map).
 */
export interface PhotoShelf {
  keep(photo: WaitingPhoto): Promise<void>;
  all(): Promise<WaitingPhoto[]>;
  remove(id: string): Promise<void>;
}
