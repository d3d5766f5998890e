// Draws the gallery, group by group, in leads II and V1 with the ladder and in twelve leads, and writes what defines each
// preset with its measured value: `npm run gallery -- [--out FOLDER]`. Exit code 1 when a preset misses a criterion.
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { renderStrip, type StripRecording } from '../shared/engine/render';
import { drawingToSvg } from '../shared/formats/svg';
import { courseGroups } from '../shared/gallery/course';
import { gallery, presetParameters } from '../shared/gallery/gallery';
import type { GalleryPreset } from '../shared/gallery/gallery-preset';
import { judgeCriterion } from '../shared/gallery/measure-strip';
import { layoutContactSheet } from '../shared/paper/contact-sheet';
import type { SheetParameters } from '../shared/parameters/strip-parameters';
import { svgToPng } from '../server/exports/svg-to-png';

const { values } = parseArgs({
  options: { out: { type: 'string', default: 'output/gallery' }, dpi: { type: 'string', default: '100' } },
});

interface Rendered {
  preset: GalleryPreset;
  strip: StripRecording;
}

const views: Record<string, Partial<SheetParameters>> = {
  rhythm: { layout: 'stacked', leads: ['II', 'V1'], ladder: true },
  'twelve-leads': { layout: '3x4+1', ladder: false },
};

function drawGroup(title: string, rendered: readonly Rendered[], view: Partial<SheetParameters>): Buffer {
  const cards = rendered.map(({ preset, strip }) => ({
    strip,
    title: `${preset.title} (${preset.id})`,
    caption: preset.teachingPoint,
  }));
  const sheet = { ...cards[0].strip.parameters.sheet, gridTint: 'rose' as const, ...view };
  const drawing = layoutContactSheet(cards, {
    title,
    subtitle: `${cards.length} presets`,
    sheet,
    columns: 2,
  });
  return svgToPng(drawingToSvg(drawing), Number(values.dpi));
}

const csvCell = (value: string): string => `"${value.replaceAll('"', '""')}"`;

/** One line for each criterion: preset, measure, limits, value, result, source. */
function criteriaRows({ preset, strip }: Rendered): { line: string; met: boolean }[] {
  return preset.criteria.map((criterion) => {
    const { value, met } = judgeCriterion(strip, criterion);
    const cells = [
      preset.id,
      criterion.measure,
      String(criterion.min ?? ''),
      String(criterion.max ?? ''),
      value === null ? '' : String(Number(value.toFixed(3))),
      met ? 'met' : 'missed',
      criterion.source,
    ];
    return { line: cells.map(csvCell).join(','), met };
  });
}

mkdirSync(values.out, { recursive: true });
const rows = [];
for (const [position, group] of courseGroups.entries()) {
  const rendered = gallery
    .filter((preset) => preset.group === group.id)
    .map((preset) => ({ preset, strip: renderStrip(presetParameters(preset)) }));
  for (const [view, sheet] of Object.entries(views)) {
    const file = join(values.out, `${position + 1}-${group.id}-${view}.png`);
    writeFileSync(file, drawGroup(group.title, rendered, sheet));
    process.stdout.write(`${file}\n`);
  }
  rows.push(...rendered.flatMap(criteriaRows));
}
const table = join(values.out, 'criteria.csv');
const head = 'preset,measure,min,max,value,result,source';
writeFileSync(table, `${[head, ...rows.map((row) => row.line)].join('\n')}\n`);
const missed = rows.filter((row) => !row.met).length;
process.stdout.write(`${table}: ${gallery.length} presets, ${rows.length} criteria, ${missed} missed\n`);
process.exitCode = missed === 0 ? 0 : 1;
