import type { Criterion, CriterionId } from '../criteria';
import type { Finding, ReadingFigures } from '../reading';
import { listWords } from '../words';

/** What makes a rule positive, in words. */
const partWords: Partial<Record<CriterionId, string>> = {
  'sgarbossa.concordantElevation': 'concordant ST elevation of at least 1 mm',
  'sgarbossa.concordantDepression': 'ST depression of at least 1 mm in V1 to V3',
  'modified.ratio': 'ST elevation of at least a quarter of the S wave',
};

function ruleFinding(criteria: readonly Criterion[]): Finding[] {
  const rule = criteria.find((one) => one.id === 'modified.rule');
  if (!rule?.met) return [];
  const parts = criteria.filter((one) => one.met && one.id in partWords);
  const words = parts.map((part) => `${partWords[part.id] ?? ''} (${part.leads.join(', ')})`);
  return [
    {
      id: 'injury.modifiedRule',
      text: `The modified criteria for infarction in a wide QRS are met: ${listWords(words)}. They support a suspicion; not meeting them rules nothing out.`,
      beats: rule.beats,
    },
  ];
}

function nativeFinding(criteria: readonly Criterion[]): Finding[] {
  const native = criteria.find((one) => one.id === 'native.stElevation');
  if (!native?.met) return [];
  return [
    {
      id: 'injury.native',
      text: `ST elevation in leads beside each other in narrow beats: ${native.leads.join(', ')}.`,
      beats: native.beats,
    },
  ];
}

/** What the criteria of acute injury say, when they say something. */
export function injuryFindings({ criteria }: ReadingFigures): Finding[] {
  return criteria === null ? [] : [...ruleFinding(criteria), ...nativeFinding(criteria)];
}
