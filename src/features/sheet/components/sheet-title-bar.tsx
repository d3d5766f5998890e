import { Link } from 'react-router-dom';
import type { Strip } from '../../../../shared/api/strips';
import { mostArchivePages, sheetDpis, usualSheetDpi } from '../../../../shared/api/sheets';
import type { PageSetup } from '../../../../shared/parameters/page-setup';
import { Button, buttonClass } from '../../../components/button';
import { Menu, MenuItem } from '../../../components/menu';
import { Chevron } from '../../../components/select-field';
import { paths } from '../../../lib/paths';
import type { SheetFiles, WantedFile } from '../state/use-sheet-files';

interface SheetTitleBarProps {
  strips: readonly Strip[];
  sheets: PageSetup['sheets'];
  files: SheetFiles;
  /** The page on the desk, from 1, and how many there are. */
  page: number;
  pages: number;
  /** Whether every strip is drawn, so that files can be made. */
  ready: boolean;
}

const dpiWords = { 150: 'for screens', 300: 'for print', 600: 'for fine print' } as const;
const formatNames = { pdf: 'PDF', svg: 'SVG', png: 'PNG' } as const;

function Title({ strips }: { strips: readonly Strip[] }) {
  const [first] = strips;
  return (
    <h1 className="min-w-0 grow text-title font-semibold tracking-[-0.012em] break-words">
      Sheet{' '}
      {first && (
        <span className="font-normal text-ink-2">
          <Link to={paths.strip(first.id)} className="hover:underline">
            {first.title}
          </Link>
          {strips.length > 1 && ` and ${strips.length - 1} more`}
        </span>
      )}
    </h1>
  );
}

function FileMenu({
  name,
  disabled,
  children,
}: {
  name: string;
  disabled: boolean;
  children: React.ReactNode;
}) {
  if (disabled) return <Button disabled>{name}</Button>;
  return (
    <Menu
      label={`${name} files`}
      trigger={
        <span className={buttonClass('plain')}>
          {name} <Chevron />
        </span>
      }
    >
      {children}
    </Menu>
  );
}

/** What the sheet is of, and what can be made of it. */
export function SheetTitleBar({ strips, sheets, files, page, pages, ready }: SheetTitleBarProps) {
  const busy = files.making !== null;
  const off = !ready || busy;
  const item = (words: string, wanted: WantedFile) => (
    <MenuItem onSelect={() => files.make(wanted)}>{words}</MenuItem>
  );
  return (
    <header className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-rule px-4 py-3 tablet:px-6">
      <Title strips={strips} />
      <div className="flex flex-wrap items-center gap-2">
        <Button disabled={off} onClick={() => void files.copyPicture(page)}>
          Copy picture
        </Button>
        <Button disabled={off} onClick={() => files.make({ format: 'pdf', page: null })}>
          PDF
        </Button>
        <FileMenu name="SVG" disabled={off}>
          {item('This page', { format: 'svg', page })}
          {pages > 1 && item(`All ${pages} pages, as ZIP`, { format: 'svg', page: null })}
        </FileMenu>
        <FileMenu name="PNG" disabled={off}>
          {sheetDpis.map((dpi) => (
            <MenuItem key={dpi} onSelect={() => files.make({ format: 'png', page, dpi })}>
              This page, {dpi} dpi {dpiWords[dpi]}
            </MenuItem>
          ))}
          {pages > 1 &&
            pages <= mostArchivePages[usualSheetDpi] &&
            item(`All ${pages} pages, ${usualSheetDpi} dpi, as ZIP`, {
              format: 'png',
              page: null,
              dpi: usualSheetDpi,
            })}
        </FileMenu>
        <Button kind="primary" disabled={!ready} onClick={() => window.print()}>
          {sheets === 'both' ? 'Print both' : 'Print'}
        </Button>
        <span role="status" className="text-dense text-ink-3 empty:-ml-2 wide:order-first">
          {files.making && `Making the ${formatNames[files.making.format]} …`}
        </span>
      </div>
    </header>
  );
}
