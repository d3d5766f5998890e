import { RadioGroup } from 'radix-ui';
import type { PageSetup } from '../../../../shared/parameters/page-setup';
import { classNames } from '../../../lib/class-names';

type Layout = PageSetup['layout'];

/** Rows of a layout in small: into how many parts each row is cut. Labels have thin spaces. */
const layouts: readonly { value: Layout; label: string; rows: readonly number[] }[] = [
  { value: '3x4+1', label: '3 × 4 + 1', rows: [4, 4, 4, 1] },
  { value: '3x4', label: '3 × 4', rows: [4, 4, 4] },
  { value: '3x4+3', label: '3 × 4 + 3', rows: [4, 4, 4, 1, 1, 1] },
  { value: '6x2', label: '6 × 2', rows: [2, 2, 2, 2, 2, 2] },
  { value: '12x1', label: '12 × 1', rows: new Array<number>(12).fill(1) },
  { value: 'stacked', label: 'Chosen', rows: [1, 1] },
  { value: 'single', label: '1 lead', rows: [1] },
];

const box = { widthPx: 36, heightPx: 26, gapPx: 2 } as const;

function rowPath(parts: number, y: number): string {
  const partPx = (box.widthPx - (parts - 1) * box.gapPx) / parts;
  return Array.from({ length: parts }, (_, i) => `M${i * (partPx + box.gapPx)} ${y}h${partPx}`).join('');
}

function Diagram({ rows }: { rows: readonly number[] }) {
  const stepPx = Math.min(6, box.heightPx / rows.length);
  const topPx = (box.heightPx - stepPx * (rows.length - 1)) / 2;
  return (
    <svg
      width={box.widthPx}
      height={box.heightPx}
      fill="none"
      stroke="currentColor"
      strokeWidth={rows.length > 6 ? 1.2 : 1.7}
      aria-hidden="true"
    >
      <path d={rows.map((parts, i) => rowPath(parts, topPx + i * stepPx)).join('')} />
    </svg>
  );
}

/** The layouts as tiles with a tiny picture of their rows; arrow keys walk them. */
export function LayoutTiles({ value, onChange }: { value: Layout; onChange(layout: Layout): void }) {
  return (
    <RadioGroup.Root
      aria-label="Layout"
      value={value}
      onValueChange={(next) => onChange(next as Layout)}
      className="grid grid-cols-4 gap-1.5"
    >
      {layouts.map(({ value: layout, label, rows }) => (
        <RadioGroup.Item
          key={layout}
          value={layout}
          className={classNames(
            'flex flex-col items-center gap-1 rounded-control border bg-sheet pt-2 pb-1.5 text-caption whitespace-nowrap',
            layout === value
              ? 'border-teal font-semibold outline-1 outline-teal'
              : 'border-edge text-ink-2 hover:bg-sunk',
          )}
        >
          <Diagram rows={rows} />
          {label}
        </RadioGroup.Item>
      ))}
    </RadioGroup.Root>
  );
}
