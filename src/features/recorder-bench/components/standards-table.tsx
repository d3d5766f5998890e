import type { Conformance, ConformanceRow, Finding } from '../../../../shared/recorder-bench/conformance';
import { marginWords } from '../../../../shared/recorder-bench/report';
import { classNames } from '../../../lib/class-names';

const verdicts = {
  met: { sign: '✓', word: 'met', className: 'text-teal-dark' },
  failed: { sign: '×', word: 'failed', className: 'text-red' },
  notClaimed: { sign: '–', word: 'not claimed', className: 'text-ink-3' },
} as const;

/** What of the limit is left, as a ruler: full is all of it, the stroke at its left is the limit. */
function MarginRuler({ margin }: { margin: number | null }) {
  if (margin === null) return null;
  const share = Math.max(0, Math.min(1, margin));
  return (
    <span
      role="img"
      aria-label={marginWords(margin)}
      className="relative mt-1 block h-2 w-24 border-l-2 border-edge before:absolute before:top-[3px] before:left-0 before:h-px before:w-full before:bg-rule-strong before:content-['']"
    >
      <span
        className={classNames('absolute top-0.5 left-0 h-1', margin < 0 ? 'bg-red' : 'bg-teal')}
        style={{ width: margin < 0 ? '100%' : `${Math.max(2, 100 * share)}%` }}
      />
    </span>
  );
}

function FindingCell({ finding }: { finding: Finding }) {
  const { sign, word, className } = verdicts[finding.verdict];
  return (
    <>
      <span className={classNames('flex gap-1.5', className)}>
        <span aria-hidden="true" className="w-3 shrink-0 font-semibold">
          {sign}
        </span>
        <span className="sr-only">{word}: </span>
        <span className={classNames(finding.measured !== null && 'font-mono')}>
          {finding.measured ?? 'cannot be applied'}
        </span>
      </span>
      {finding.verdict === 'notClaimed' ? (
        <span className="mt-0.5 block pl-4.5 text-caption text-ink-3">not claimed: {finding.reason}</span>
      ) : (
        <span className="block pl-4.5">
          <MarginRuler margin={finding.margin} />
        </span>
      )}
    </>
  );
}

function Source({ row }: { row: ConformanceRow }) {
  return (
    <span className="block text-caption text-ink-3">
      {row.source.text}; {row.source.provenance}
    </span>
  );
}

/** Every requirement with what each setting gave; on a phone each row becomes pairs. */
export function StandardsTable({ conformance }: { conformance: Conformance }) {
  const { settings, rows } = conformance;
  return (
    <table className="w-full text-dense max-tablet:block">
      <thead className="max-tablet:sr-only">
        <tr className="border-b border-edge text-left text-ink-2">
          <th className="py-1.5 pr-4 font-medium">What is applied, and where the limit comes from</th>
          <th className="py-1.5 pr-4 font-medium">Limit</th>
          {settings.map(({ name, band }, i) => (
            <th key={i} className="py-1.5 pr-4 font-medium">
              {name}
              <span className="block text-caption font-normal text-ink-3">{band}</span>
            </th>
          ))}
        </tr>
      </thead>
      <tbody className="max-tablet:block">
        {rows.map((row) => (
          <tr key={row.id} className="border-b border-rule align-top max-tablet:block max-tablet:py-2">
            <th scope="row" className="py-2 pr-4 text-left font-normal max-tablet:block max-tablet:py-0">
              {row.applied}
              <Source row={row} />
            </th>
            <td className="py-2 pr-4 whitespace-nowrap max-tablet:block max-tablet:py-1 max-tablet:whitespace-normal">
              <span className="mr-1 text-ink-3 tablet:hidden">Limit:</span>
              {row.limit}
            </td>
            {row.findings.map((finding, i) => (
              <td key={i} className="py-2 pr-4 max-tablet:flex max-tablet:gap-3 max-tablet:py-1">
                <span className="w-28 shrink-0 text-ink-3 tablet:hidden">{settings[i]?.name}</span>
                <span className="block min-w-0">
                  <FindingCell finding={finding} />
                </span>
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
