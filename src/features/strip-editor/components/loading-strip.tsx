import { gridColours, type GridTint } from '../../../../shared/paper/tokens';

/** The paper appears first, then a dotted baseline: no grey blocks, no spinner. */
export function LoadingStrip({ durationS, tint }: { durationS: number; tint: GridTint }) {
  const { ground, minor, major } = gridColours[tint];
  const lines = (colour: string, step: number): string =>
    `repeating-linear-gradient(0deg, ${colour} 0 1px, transparent 1px ${step}px), repeating-linear-gradient(90deg, ${colour} 0 1px, transparent 1px ${step}px)`;
  return (
    <div
      role="status"
      className="relative mt-8 h-60 border-y border-edge"
      style={{ backgroundColor: ground, backgroundImage: `${lines(major, 25)}, ${lines(minor, 5)}` }}
    >
      <p className="px-4 pt-2 text-dense text-ink-2 tablet:px-6">Rendering {durationS} s</p>
      <div className="absolute inset-x-0 top-1/2 border-t border-dotted border-ink-3" />
    </div>
  );
}
