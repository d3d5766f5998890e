import { useCallback, useEffect, useMemo, useState } from 'react';
import { presetFileName } from '../../../shared/api/preset-files';
import type { Strip } from '../../../shared/api/strips';
import { drawsDifferently, engineVersion } from '../../../shared/engine/engine-version';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import { requestPresetFile } from '../../api/preset-files';
import { Button } from '../../components/button';
import { ConfirmDialog } from '../../components/dialog';
import { Notice } from '../../components/notice';
import { useToast } from '../../components/toast';
import { download } from '../../lib/download';
import { copyStripPicture } from './commands/copy-picture';
import { useEditorShortcuts } from './commands/use-editor-shortcuts';
import { DetailsDialog } from './components/details-dialog';
import { DownloadDialog } from './components/download/download-dialog';
import { LoadingStrip } from './components/loading-strip';
import { ParameterPath } from './groups/parameter-path';
import { ReadingPanel } from './components/reading-panel';
import { StaleDialog } from './components/stale-dialog';
import { StartingPoint } from './components/starting-point';
import { StripView } from './components/strip-view';
import { TitleBar } from './components/title-bar';
import { ToolRow } from './components/tool-row';
import { draftHash } from './state/address-draft';
import { dropDraft, storeDraft } from './state/draft-storage';
import { detailsOf, type StripDetails } from './state/strip-details';
import { useParameters } from './state/use-parameters';
import { usePreview } from './state/use-preview';
import { isProblem, useSaving } from './state/use-saving';
import { useUnsavedGuard } from './state/use-unsaved-guard';
import { startView, type ViewState } from './state/view-state';

export interface StripEditorProps {
  /** null: a strip that was never saved. */
  strip: Strip | null;
  /** What to start from: the strip's parameters, or a draft that was kept. */
  initial: StripParameters;
  /** Where `initial` comes from, when it is not what was saved. */
  origin: 'saved' | 'keptDraft' | 'address';
  onSavedAs(strip: Strip): void;
  onDuplicate(): void;
}

type OpenDialog = 'none' | 'saveNew' | 'details' | 'download';

/** A strip laid out in columns opens with all its leads. */
function viewOf({ sheet }: StripParameters): ViewState {
  return { ...startView, twelve: sheet.layout !== 'single' && sheet.layout !== 'stacked' };
}

const same = (a: StripParameters, b: StripParameters): boolean => JSON.stringify(a) === JSON.stringify(b);

/** The strip editor: strip on top, parameters under it, reading beside them. */
export function StripEditor({ strip, initial, origin, onSavedAs, onDuplicate }: StripEditorProps) {
  const editor = useParameters(initial);
  const [view, setView] = useState<ViewState>(() => viewOf(initial));
  const [saved, setSaved] = useState<Strip | null>(strip);
  const [dialog, setDialog] = useState<OpenDialog>('none');
  const [stale, setStale] = useState<Strip | null>(null);
  const [saveError, setSaveError] = useState<string | null>(null);
  const [showOrigin, setShowOrigin] = useState(origin !== 'saved');
  const [fresh] = useState(initial);
  const saving = useSaving();
  const toast = useToast();
  const { parameters } = editor;

  const base = saved?.parameters ?? (origin === 'saved' ? fresh : null);
  const unsaved = base === null || !same(parameters, base);
  const outdated = saved !== null && saved.keptBy !== 'gallery' && drawsDifferently(saved.engineVersion);
  const { blocker, letGo } = useUnsavedGuard(unsaved);
  const stripId = saved?.id ?? null;
  useEffect(() => {
    if (unsaved) storeDraft(stripId, { parameters, version: saved?.version ?? 0 });
    else dropDraft(stripId);
  }, [unsaved, stripId, parameters, saved?.version]);

  const wish = useMemo(
    () => ({ electrodes: view.trace !== 'recorded', compare: view.compare }),
    [view.trace, view.compare],
  );
  const { state, retry } = usePreview(parameters, wish);
  const preview = state.kind === 'waiting' ? null : state.preview;
  const changeView = useCallback(
    (change: Partial<ViewState>) => setView((old) => ({ ...old, ...change })),
    [],
  );
  const chooseBeats = useCallback(
    (chosenBeats: readonly number[]) => changeView({ chosenBeats }),
    [changeView],
  );

  const hoverBeat = useCallback((beat: number | null) => changeView({ hoverBeat: beat }), [changeView]);

  const finish = (done: Strip, words: string): void => {
    setSaved(done);
    editor.replace(done.parameters);
    setDialog('none');
    setSaveError(null);
    toast(words);
  };
  const saveVersion = async (details: StripDetails | null = null): Promise<void> => {
    if (!saved) return setDialog('saveNew');
    const current = detailsOf(saved, saved.title);
    const kept = { details: details ?? (current as StripDetails), parameters };
    const outcome = await saving.update(saved, kept);
    if (!isProblem(outcome)) finish(outcome, `Version ${outcome.version} saved`);
    else if (outcome.kind === 'stale') {
      setDialog('none');
      setStale(outcome.current);
    } else if (details) setSaveError(outcome.words);
    else toast(`Not saved. ${outcome.words}`);
  };
  const saveNew = async (details: StripDetails): Promise<void> => {
    const outcome = await saving.create({ details, parameters });
    if (isProblem(outcome)) {
      setSaveError(outcome.kind === 'refused' ? outcome.words : 'Try again.');
      return;
    }
    dropDraft(stripId);
    finish(outcome, 'Strip saved');
    letGo();
    onSavedAs(outcome);
  };
  const takeTheirs = (): void => {
    if (!stale) return;
    setSaved(stale);
    editor.restart(stale.parameters);
    setStale(null);
  };
  const copyAddress = async (): Promise<void> => {
    const address = new URL(`/strips/new${draftHash(parameters)}`, window.location.origin).href;
    window.history.replaceState(window.history.state, '', draftHash(parameters));
    try {
      await navigator.clipboard.writeText(address);
      toast('Address copied; it carries the whole draft');
    } catch {
      toast('The address bar now carries the whole draft');
    }
  };
  const copy = async (): Promise<void> => {
    if (!preview) return;
    const outcome = await copyStripPicture(preview.recorded, view.twelve);
    toast(outcome === 'copied' ? 'Picture copied' : 'Picture saved as strip.png');
  };
  const savePreset = async (): Promise<void> => {
    if (!saved) return;
    try {
      const bytes = await requestPresetFile({ ids: [saved.id] });
      download(presetFileName, 'application/json', bytes);
    } catch (error) {
      toast(`The preset file was not saved. ${(error as Error).message}`);
    }
  };
  const newTitle = saved ? `${saved.title} (copy)` : parameters.title;
  useEditorShortcuts({ undo: editor.undo, redo: editor.redo, save: () => void saveVersion() });

  return (
    <main className="flex grow flex-col">
      <TitleBar
        strip={saved}
        editor={editor}
        unsaved={unsaved}
        outdated={outdated}
        busy={saving.busy}
        onSave={() => void saveVersion()}
        onSaveAs={() => setDialog('saveNew')}
        onDetails={() => setDialog('details')}
        onDuplicate={onDuplicate}
        onDownload={() => setDialog('download')}
        onSavePreset={() => void savePreset()}
        onCopyAddress={() => void copyAddress()}
        onCopyPicture={() => void copy()}
      />
      {showOrigin && (
        <div className="flex flex-wrap items-center gap-3 px-4 pt-3 tablet:px-6">
          <Notice
            kind="teal"
            title={
              origin === 'address' ? 'This draft came with the address.' : 'Your unsaved changes are back.'
            }
          >
            {saved && 'The saved version is untouched.'}
          </Notice>
          {saved && origin === 'keptDraft' && (
            <Button
              small
              onClick={() => {
                editor.restart(saved.parameters);
                setShowOrigin(false);
              }}
            >
              Back to the saved version
            </Button>
          )}
          <Button small kind="quiet" onClick={() => setShowOrigin(false)}>
            Hide
          </Button>
        </div>
      )}
      {saved && outdated && (
        <div className="px-4 pt-3 tablet:px-6">
          <Notice kind="amber" title={`This strip was saved with engine ${saved.engineVersion}.`}>
            {`Engine ${engineVersion} draws it anew: shapes differ, parameters and timing do not. Look it over; saving keeps it with the new engine.`}
          </Notice>
        </div>
      )}
      <ToolRow editor={editor} view={view} onView={changeView} />
      {state.kind === 'failed' && (
        <div className="flex items-center gap-3 px-4 pb-2 tablet:px-6">
          <Notice kind="red" title="The strip could not be rendered.">
            Your parameters are kept. {state.message}
          </Notice>
          <Button small onClick={retry}>
            Try again
          </Button>
        </div>
      )}
      {preview ? (
        <StripView preview={preview} view={view} onChooseBeats={chooseBeats} onHoverBeat={hoverBeat} />
      ) : (
        <LoadingStrip durationS={parameters.durationS} tint={parameters.sheet.gridTint} />
      )}
      <div className="grid grow grid-cols-[minmax(0,1fr)] content-start desk:grid-cols-[minmax(0,1fr)_minmax(320px,30%)]">
        <div className="pt-3.5">
          <StartingPoint onApply={(start) => editor.replace({ ...start, sheet: parameters.sheet })} />
          <ParameterPath editor={editor} />
        </div>
        <aside className="border-t border-rule desk:border-t-0 desk:border-l">
          {preview && (
            <ReadingPanel
              reading={preview.recorded.reading}
              chosenBeats={view.chosenBeats}
              hoverBeat={view.hoverBeat}
              onChooseBeats={chooseBeats}
            />
          )}
        </aside>
      </div>
      {dialog === 'download' && (
        <DownloadDialog
          parameters={parameters}
          stripId={unsaved ? null : stripId}
          onClose={() => setDialog('none')}
        />
      )}
      {(dialog === 'saveNew' || dialog === 'details') && (
        <DetailsDialog
          title={dialog === 'saveNew' ? 'Save as a new strip' : 'About this strip'}
          action={dialog === 'saveNew' ? 'Save strip' : 'Save version'}
          initial={
            dialog === 'saveNew' ? { ...detailsOf(saved, newTitle), title: newTitle } : detailsOf(saved, '')
          }
          visibilityFixed={dialog === 'details' && saved?.canDelete === false}
          busy={saving.busy}
          error={saveError}
          onSave={(details) => void (dialog === 'saveNew' ? saveNew(details) : saveVersion(details))}
          onClose={() => {
            setDialog('none');
            setSaveError(null);
          }}
        />
      )}
      {stale && (
        <StaleDialog
          current={stale}
          onKeepCopy={() => {
            setStale(null);
            setDialog('saveNew');
          }}
          onTakeTheirs={takeTheirs}
          onClose={() => setStale(null)}
        />
      )}
      <ConfirmDialog
        open={blocker.state === 'blocked'}
        title="Leave without saving?"
        description="Your changes to this strip are not saved. They are kept in this tab until you come back or close it."
        safe="Keep editing"
        action="Leave"
        danger
        onAct={() => blocker.proceed?.()}
        onClose={() => blocker.reset?.()}
      />
    </main>
  );
}
