import type { Conformance, Finding } from './conformance';

/** When and with what a report was made. */
export interface ReportOrigin {
  /** Day, as YYYY-MM-DD; passed in. */
  madeOn: string;
  productVersion: string;
  engineVersion: string;
}

export const reportTitle = 'Recorder conformance report';
export const reportCaution =
  'Measured on a simulated recorder for synthetic teaching strips; says nothing about any device for patients.';

const verdictWords = { met: 'met', failed: 'FAILED', notClaimed: 'not claimed' } as const;

/** The versions line of a report. */
export function originWords({ madeOn, productVersion, engineVersion }: ReportOrigin): string {
  return `Made on ${madeOn} with Paceloom ${productVersion}, engine ${engineVersion}`;
}

/** What is left of the limit: `62 % of the limit left`, `beyond the limit by 27 %`; empty where nothing is judged. At most 100 % is left. */
export function marginWords(margin: number | null): string {
  if (margin === null) return '';
  const share = Math.min(1, Math.abs(margin));
  const percent = (100 * share).toFixed(share < 0.1 ? 1 : 0);
  return margin < 0
    ? `beyond the limit by ${Math.abs(100 * margin).toFixed(0)} %`
    : `${percent} % of the limit left`;
}

/** A field of RFC 4180. */
function csvField(text: string): string {
  return /[",\r\n]/u.test(text) ? `"${text.replace(/"/gu, '""')}"` : text;
}

/**
 * The table as CSV (RFC 4180, CRLF): a line of origin, a header, then one row for each requirement and setting.
 */
export function conformanceCsv(conformance: Conformance, origin: ReportOrigin): string {
  const header = [
    'requirement',
    'applied',
    'source',
    'provenance',
    'limit',
    'setting',
    'band',
    'samples_per_s',
    'resolution_uv',
    'measured',
    'value',
    'unit',
    'margin_of_limit',
    'verdict',
    'reason',
    'made_on',
    'product_version',
    'engine_version',
  ];
  const rows = conformance.rows.flatMap((row) =>
    row.findings.map((finding, i) => {
      const { name, band, sampleRateHz, resolutionUv } = conformance.settings[i];
      return [
        row.id,
        row.applied,
        row.source.text,
        row.source.provenance,
        row.limit,
        name,
        band,
        String(sampleRateHz),
        String(resolutionUv),
        finding.measured ?? '',
        finding.value === null ? '' : String(finding.value),
        row.unit,
        finding.margin === null ? '' : String(finding.margin),
        verdictWords[finding.verdict],
        finding.reason ?? '',
        origin.madeOn,
        origin.productVersion,
        origin.engineVersion,
      ];
    }),
  );
  return [header, ...rows].map((fields) => `${fields.map(csvField).join(',')}\r\n`).join('');
}

function findingWords({ verdict, measured, margin, reason }: Finding): string {
  const figures = [measured ?? 'cannot be applied', verdict === 'notClaimed' ? '' : marginWords(margin)]
    .filter(Boolean)
    .join(', ');
  return `${verdictWords[verdict].padEnd(12)}${figures}${reason ? ` (${reason})` : ''}`;
}

/** The table as text for a terminal. */
export function conformanceText(conformance: Conformance, origin: ReportOrigin): string {
  const names = conformance.settings.map(
    ({ name, band, sampleRateHz, resolutionUv }) =>
      `${name}, ${band}, ${sampleRateHz} samples/s, ${resolutionUv} µV`,
  );
  const widest = Math.max(...names.map((name) => name.length));
  const rows = conformance.rows.map((row) =>
    [
      `${row.applied}`,
      `  limit: ${row.limit}; ${row.source.text} (${row.source.provenance})`,
      ...row.findings.map((finding, i) => `  ${names[i].padEnd(widest)}  ${findingWords(finding)}`),
    ].join('\n'),
  );
  return `${[reportTitle, originWords(origin), reportCaution, '', ...rows, '', summary(conformance)].join('\n')}\n`;
}

/** How many requirements each setting meets of those that it claims. */
export function summary({ settings, rows }: Conformance): string {
  return settings
    .map(({ name, band }, i) => {
      const claimed = rows.filter(({ findings }) => findings[i].verdict !== 'notClaimed');
      const met = claimed.filter(({ findings }) => findings[i].verdict === 'met').length;
      return `${name}, ${band}: ${met} of ${claimed.length} claimed requirements met`;
    })
    .join('\n');
}
