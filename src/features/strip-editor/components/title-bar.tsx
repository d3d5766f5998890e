import { Link } from 'react-router-dom';
import type { Strip } from '../../../../shared/api/strips';
import { Button, buttonClass } from '../../../components/button';
import { Tag } from '../../../components/chip';
import { Chevron } from '../../../components/select-field';
import { Menu, MenuItem } from '../../../components/menu';
import { paths } from '../../../lib/paths';
import type { ParametersEditor } from '../state/use-parameters';

interface TitleBarProps {
  strip: Strip | null;
  editor: ParametersEditor;
  unsaved: boolean;
  /** Saved with an engine that drew it differently: worth saving again as it is. */
  outdated: boolean;
  busy: boolean;
  onSave(): void;
  onSaveAs(): void;
  onDetails(): void;
  onDuplicate(): void;
  onDownload(): void;
  onSavePreset(): void;
  onCopyAddress(): void;
  onCopyPicture(): void;
}

function stateWords(strip: Strip | null, unsaved: boolean): string {
  if (!strip) return unsaved ? 'Not saved yet' : 'New strip';
  if (strip.keptBy === 'gallery') return unsaved ? 'Gallery strip, changed here' : 'Gallery strip';
  return `Version ${strip.version}, ${unsaved ? 'changes not saved' : 'saved'}`;
}

function Undo({ flipped }: { flipped?: boolean }) {
  return (
    <svg
      viewBox="0 0 16 16"
      className={`size-4 ${flipped ? '-scale-x-100' : ''}`}
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
      aria-hidden="true"
    >
      <path d="M6 3 2.5 6.5 6 10M2.5 6.5h7a4 4 0 0 1 0 8H7" />
    </svg>
  );
}

/** Title, what is saved of it, undo and redo, save. */
export function TitleBar(props: TitleBarProps) {
  const { strip, editor, unsaved, outdated, busy } = props;
  const canSave = strip === null || strip.canEdit;
  return (
    <header className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-rule px-4 py-3 tablet:px-6">
      <div className="flex min-w-0 grow flex-wrap items-baseline gap-x-3 gap-y-1">
        <h1 className="max-w-full text-title font-semibold tracking-[-0.012em] break-words">
          {strip?.title ?? 'New strip'}
        </h1>
        <span className="flex flex-wrap gap-1.5">
          {strip?.tags.slice(0, 3).map((tag) => (
            <Tag key={tag}>{tag}</Tag>
          ))}
        </span>
        <span role="status" className="text-dense text-ink-3">
          {stateWords(strip, unsaved)}
        </span>
      </div>
      <div className="flex flex-wrap items-center gap-2">
        <Button aria-label="Undo" disabled={!editor.canUndo} onClick={editor.undo}>
          <Undo />
        </Button>
        <Button aria-label="Redo" disabled={!editor.canRedo} onClick={editor.redo}>
          <Undo flipped />
        </Button>
        <Menu
          label="More actions"
          trigger={
            <span className="inline-flex h-[34px] items-center gap-2 rounded-control border border-edge bg-sheet px-3.5 text-body font-medium">
              More <Chevron />
            </span>
          }
        >
          <MenuItem onSelect={props.onDownload}>Download …</MenuItem>
          <MenuItem onSelect={props.onSaveAs}>Save as a new strip</MenuItem>
          {strip?.canEdit && <MenuItem onSelect={props.onDetails}>Title, teaching point, tags</MenuItem>}
          {strip && <MenuItem onSelect={props.onDuplicate}>Duplicate the saved strip</MenuItem>}
          {strip && <MenuItem onSelect={props.onSavePreset}>Preset file of the saved strip</MenuItem>}
          <MenuItem onSelect={props.onCopyAddress}>Copy address of this draft</MenuItem>
        </Menu>
        <Button onClick={props.onCopyPicture}>Copy picture</Button>
        {strip && (
          <Link to={paths.sheet(strip.id)} className={buttonClass('plain')}>
            {unsaved ? 'Sheet as saved' : 'Sheet'}
          </Link>
        )}
        {canSave ? (
          <Button
            kind="primary"
            disabled={busy || (strip !== null && !unsaved && !outdated)}
            onClick={props.onSave}
          >
            {busy ? 'Saving …' : strip ? 'Save version' : 'Save strip'}
          </Button>
        ) : (
          <Button kind="primary" disabled={busy} onClick={props.onSaveAs}>
            Save as my own
          </Button>
        )}
      </div>
    </header>
  );
}
