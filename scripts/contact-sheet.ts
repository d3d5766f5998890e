// Draws every preset of the gallery in twelve leads on one sheet: `npm run contact-sheet -- [--out FILE]`.
import { mkdirSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { parseArgs } from 'node:util';
import { renderStrip } from '../shared/engine/render';
import { drawingToSvg } from '../shared/formats/svg';
import { gallery, presetParameters } from '../shared/gallery/gallery';
import { layoutContactSheet } from '../shared/paper/contact-sheet';
import { svgToPng } from './render/svg-to-png';

const { values } = parseArgs({
  options: {
    out: { type: 'string', default: 'output/contact-sheet.png' },
    dpi: { type: 'string', default: '110' },
    columns: { type: 'string', default: '2' },
  },
});

const cards = gallery.map((preset) => ({
  strip: renderStrip(presetParameters(preset)),
  title: preset.title,
  caption: preset.teachingPoint,
}));
const drawing = layoutContactSheet(cards, {
  title: 'Paceloom gallery',
  subtitle: `${gallery.length} presets, twelve leads`,
  sheet: { ...cards[0].strip.parameters.sheet, layout: '3x4+1' },
  columns: Number(values.columns),
});
mkdirSync(dirname(values.out), { recursive: true });
writeFileSync(values.out, svgToPng(drawingToSvg(drawing), Number(values.dpi)));
process.stdout.write(`${values.out}\n`);
