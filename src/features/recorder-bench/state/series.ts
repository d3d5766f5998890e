/** How each setting looks in charts: by colour and by dash, so that it reads in black and white too. */
export interface SeriesLook {
  colour: string;
  dash: string | undefined;
}

export const seriesLooks: readonly SeriesLook[] = [
  { colour: '#1f2a37', dash: undefined },
  { colour: '#0a524e', dash: '7 4' },
  { colour: '#6b3fa0', dash: '2 3' },
  { colour: '#835400', dash: '10 3 2 3' },
];
