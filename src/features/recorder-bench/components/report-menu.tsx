import { useMutation } from '@tanstack/react-query';
import { engineVersion } from '../../../../shared/engine/engine-version';
import type { BenchSetting } from '../../../../shared/recorder-bench/bench-setting';
import type { Conformance } from '../../../../shared/recorder-bench/conformance';
import { conformanceCsv } from '../../../../shared/recorder-bench/report';
import { requestRecorderReport } from '../../../api/recorder-report';
import { buttonClass } from '../../../components/button';
import { Menu, MenuItem } from '../../../components/menu';
import { Chevron } from '../../../components/select-field';
import { useToast } from '../../../components/toast';
import { download } from '../../../lib/download';
import { productVersion } from '../../../lib/product-version';

interface ReportMenuProps {
  settings: readonly BenchSetting[];
  /** null while it is measured. */
  conformance: Conformance | null;
}

/** The standards table as a dated file: CSV as it stands, PDF measured again by the server. */
export function ReportMenu({ settings, conformance }: ReportMenuProps) {
  const toast = useToast();
  const madeOn = (): string => new Date().toISOString().slice(0, 10);
  const pdf = useMutation({
    mutationFn: () => requestRecorderReport({ settings: [...settings] }),
    onSuccess: (bytes) => download(`recorder-conformance-${madeOn()}.pdf`, 'application/pdf', bytes),
    onError: () => toast('The report could not be made. Nothing is lost; try again.'),
  });
  const csv = (): void => {
    if (!conformance) return;
    const text = conformanceCsv(conformance, { madeOn: madeOn(), productVersion, engineVersion });
    download(`recorder-conformance-${madeOn()}.csv`, 'text/csv', text);
  };
  return (
    <Menu
      label="Download report"
      trigger={
        <span className={buttonClass('plain')}>
          {pdf.isPending ? 'Measuring …' : 'Download report'} <Chevron />
        </span>
      }
    >
      <MenuItem onSelect={() => pdf.mutate()}>PDF, dated</MenuItem>
      {conformance && <MenuItem onSelect={csv}>CSV, dated</MenuItem>}
    </Menu>
  );
}
