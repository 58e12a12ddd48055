import { useEffect } from 'react';

/** Prints `text` at the head of each page: "2026-031, Parlour guitar, Aldous Pike 0417". */
export function useRunningHead(text: string): void {
  useEffect(() => {
    const { style } = document.documentElement;
    style.setProperty('--running-head', JSON.stringify(text));
    return () => {
      style.removeProperty('--running-head');
    };
  }, [text]);
}
