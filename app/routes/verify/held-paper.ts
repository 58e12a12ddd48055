/** A file that was dropped; it stays in this page's memory and goes nowhere. */
export interface HeldPaper {
  name: string;
  bytes: Uint8Array;
}

let held: HeldPaper | null = null;

/** Keeps a file for the page that comes next. */
export function holdPaper(paper: HeldPaper): void {
  held = paper;
}

/** Takes the file that the page before has kept. */
export function takePaper(): HeldPaper | null {
  const paper = held;
  held = null;
  return paper;
}
