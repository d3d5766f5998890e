import { useEffect, useState } from 'react';

/** Every cut that a page of paper is set in. */
const cuts = ['400', '500', '600'].map((weight) => `${weight} 16px "IBM Plex Sans"`);
const monoCuts = ['400', '500'].map((weight) => `${weight} 16px "IBM Plex Mono"`);

let loading: Promise<unknown> | null = null;

/** Loads the fonts that a canvas needs; a canvas does not fetch them by itself. Never rejects: others stand in. */
export function loadPaperFonts(): Promise<unknown> {
  loading ??= Promise.all([...cuts, ...monoCuts].map((cut) => document.fonts.load(cut))).catch(() => null);
  return loading;
}

/** Whether the fonts of the paper are there; until then a canvas would paint with others. */
export function usePaperFonts(): boolean {
  const [loaded, setLoaded] = useState(false);
  useEffect(() => {
    let current = true;
    void loadPaperFonts().then(() => current && setLoaded(true));
    return () => {
      current = false;
    };
  }, []);
  return loaded;
}
