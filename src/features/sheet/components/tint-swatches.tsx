import { RadioGroup } from 'radix-ui';
import { gridColours, type GridTint } from '../../../../shared/paper/tokens';
import { classNames } from '../../../lib/class-names';

const tints = Object.keys(gridColours) as GridTint[];
const size = { widthPx: 36, heightPx: 25, boxPx: 5 } as const;

/** Lines every `boxPx`, both ways. */
const gridPath = [
  ...Array.from(
    { length: Math.floor(size.widthPx / size.boxPx) },
    (_, i) => `M${(i + 1) * size.boxPx} 0v${size.heightPx}`,
  ),
  ...Array.from(
    { length: Math.floor(size.heightPx / size.boxPx) },
    (_, i) => `M0 ${(i + 1) * size.boxPx}h${size.widthPx}`,
  ),
].join('');

/** The tints of the grid as small pieces of paper. */
export function TintSwatches({ value, onChange }: { value: GridTint; onChange(tint: GridTint): void }) {
  return (
    <RadioGroup.Root
      aria-label="Grid tint"
      orientation="horizontal"
      value={value}
      onValueChange={(next) => onChange(next as GridTint)}
      className="grid grid-cols-5 gap-1.5"
    >
      {tints.map((tint) => (
        <RadioGroup.Item
          key={tint}
          value={tint}
          className={classNames(
            'flex flex-col items-center gap-1 rounded-control text-caption pointer-coarse:min-h-11',
            tint === value ? 'font-semibold' : 'text-ink-2 hover:text-ink',
          )}
        >
          <svg
            width={size.widthPx}
            height={size.heightPx}
            aria-hidden="true"
            className={classNames(
              'rounded-chip border',
              tint === value ? 'border-teal outline-2 outline-teal' : 'border-edge',
            )}
            style={{ background: gridColours[tint].ground }}
          >
            <path d={gridPath} stroke={gridColours[tint].major} fill="none" />
          </svg>
          {tint}
        </RadioGroup.Item>
      ))}
    </RadioGroup.Root>
  );
}
