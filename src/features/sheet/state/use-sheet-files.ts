import { useMutation } from '@tanstack/react-query';
import { sheetFileName, type SheetDpi, type SheetFormat } from '../../../../shared/api/sheets';
import type { SheetDocument } from '../../../../shared/paper/pages/sheet-document';
import type { PageSetup } from '../../../../shared/parameters/page-setup';
import { ApiError } from '../../../api/http';
import { requestSheets } from '../../../api/sheets';
import { useToast } from '../../../components/toast';
import { copyPicture } from '../../../lib/canvas/copy-picture';
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

function reason(error: Error): string {
  if (!(error instanceof ApiError)) return error.message;
  const [problem] = error.problems;
  return problem ? `${problem.path} is ${problem.value}; allowed is ${problem.allowed}.` : error.message;
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
  const copyPage = async (page: number): Promise<void> => {
    const drawing = document?.pages[page - 1];
    if (!drawing) return;
    const name = sheetFileName(title, { format: 'png', page });
    const outcome = await copyPicture(drawing, name);
    toast(
      outcome === 'copied'
        ? 'Picture of this page copied'
        : `This browser does not let a page copy pictures. Saved as ${name} instead.`,
    );
  };
  return {
    making: making.isPending ? making.variables : null,
    make: (wanted) => making.mutate(wanted),
    copyPicture: copyPage,
  };
}
