import { useMutation } from '@tanstack/react-query';
import { sheetFileName, type SheetDpi, type SheetFormat } from '../../../../shared/api/sheets';
import type { SheetDocument } from '../../../../shared/paper/pages/sheet-document';
import type { PageSetup } from '../../../../shared/parameters/page-setup';
import { ApiError } from '../../../api/http';
import { requestSheets } from '../../../api/sheets';
import { useToast } from '../../../components/toast';
import { pagePicture } from '../../../lib/canvas/paint-page';
import { loadPaperFonts } from '../../../lib/canvas/paper-fonts';
import { download } from '../../../lib/download';

/** A file to ask for; `page` from 1, null for all pages. */
export interface WantedFile {
  format: SheetFormat;
  page: number | null;
  dpi?: SheetDpi;
}

export interface SheetFiles {
  /** The file that is being made. */
  making: WantedFile | null;
  make(wanted: WantedFile): void;
  copyPicture(page: number): Promise<void>;
}

const mediaTypes = { pdf: 'application/pdf', svg: 'image/svg+xml', png: 'image/png' } as const;
/** Pixels a millimetre of a copied picture: 203 dots per inch, sharp on slides. */
const copiedPxPerMm = 8;

function reason(error: Error): string {
  if (!(error instanceof ApiError)) return error.message;
  const [problem] = error.problems;
  return problem ? `${problem.path} is ${problem.value}; allowed is ${problem.allowed}.` : error.message;
}

async function pngOf(canvas: HTMLCanvasElement): Promise<Blob> {
  return new Promise((done, fail) =>
    canvas.toBlob((blob) => (blob ? done(blob) : fail(new Error('no picture'))), 'image/png'),
  );
}

/** Files of the document, made by the server from the saved strips, and the picture of a page for the clipboard. */
export function useSheetFiles(
  stripIds: readonly string[],
  setup: PageSetup,
  document: SheetDocument | null,
): SheetFiles {
  const toast = useToast();
  const title = document?.title ?? '';
  const making = useMutation({
    // Without a connection it fails and says so, instead of waiting silently for one.
    networkMode: 'always',
    mutationFn: (wanted: WantedFile) =>
      requestSheets({
        strips: stripIds.map((stripId) => ({ stripId })),
        setup,
        format: wanted.format,
        page: wanted.page ?? undefined,
        dpi: wanted.dpi,
      }),
    onSuccess: (bytes, { format, page }) => {
      const zipped = page === null && format !== 'pdf';
      const name = sheetFileName(title, { format, page, zipped });
      download(name, zipped ? 'application/zip' : mediaTypes[format], bytes);
      toast(`Saved as ${name}`);
    },
    onError: (error) => toast(`The file could not be made. ${reason(error)}`),
  });
  const copyPicture = async (page: number): Promise<void> => {
    const drawing = document?.pages[page - 1];
    if (!drawing) return;
    await loadPaperFonts();
    const blob = await pngOf(pagePicture(drawing, copiedPxPerMm));
    try {
      await navigator.clipboard.write([new ClipboardItem({ 'image/png': blob })]);
      toast('Picture of this page copied');
    } catch {
      const name = sheetFileName(title, { format: 'png', page });
      download(name, 'image/png', blob);
      toast(`This browser does not let a page copy pictures. Saved as ${name} instead.`);
    }
  };
  return {
    making: making.isPending ? making.variables : null,
    make: (wanted) => making.mutate(wanted),
    copyPicture,
  };
}
