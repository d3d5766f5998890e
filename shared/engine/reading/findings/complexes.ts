import type { Finding, ReadingFigures } from '../reading';
import { numbersOf } from './chamber-words';

function axisWord(axisDeg: number): string {
  const axis = Math.round(axisDeg);
  return axis < 0 ? `−${-axis}°` : `${axis}°`;
}

function relationWords(discordant: number, judged: number): string {
  const leads = 'leads in which both are large enough to judge.';
  if (judged === 0) return 'T against QRS cannot be judged in any lead.';
  if (discordant === 0) return `T follows QRS in all ${judged} ${leads}`;
  if (discordant === judged) return `T opposes QRS in all ${judged} ${leads}`;
  return `T opposes QRS in ${discordant} of ${judged} ${leads}`;
}

/** Axis, and T against QRS, of the commonest kind of beat. */
export function complexFindings(reading: ReadingFigures): Finding[] {
  const { qrsTRelation, frontalAxisDeg } = reading;
  if (qrsTRelation === null || frontalAxisDeg === null) return [];
  const judged = Object.values(qrsTRelation).filter((relation) => relation !== null);
  const discordant = judged.filter((relation) => relation === 'discordant').length;
  const text = `Frontal axis ${axisWord(frontalAxisDeg)}; ${relationWords(discordant, judged.length)}`;
  const beats = reading.beats.filter((beat) => beat.origin === reading.dominantOrigin);
  return [{ id: 'qrsTRelation', text, beats: numbersOf(beats) }];
}
