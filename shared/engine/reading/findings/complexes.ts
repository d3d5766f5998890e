import type { Finding, ReadingFigures } from '../reading';
import { numbersOf } from './chamber-words';

function axisWord(axisDeg: number): string {
  const axis = Math.round(axisDeg);
  return axis < 0 ? `−${-axis}°` : `${axis}°`;
}

/** Axis, and T against QRS, of the commonest kind of beat. */
export function complexFindings(reading: ReadingFigures): Finding[] {
  const { qrsTRelation, frontalAxisDeg } = reading;
  if (qrsTRelation === null || frontalAxisDeg === null) return [];
  const judged = Object.values(qrsTRelation).filter((relation) => relation !== null);
  const discordant = judged.filter((relation) => relation === 'discordant').length;
  const text = `Frontal axis ${axisWord(frontalAxisDeg)}; T opposes QRS in ${discordant} of ${judged.length} leads in which both are large enough to judge.`;
  const beats = reading.beats.filter((beat) => beat.origin === reading.dominantOrigin);
  return [{ id: 'qrsTRelation', text, beats: numbersOf(beats) }];
}
