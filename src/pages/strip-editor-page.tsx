import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useLocation, useNavigate, useParams } from 'react-router-dom';
import { parseStripParameters } from '../../shared/parameters/parse';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import type { Strip } from '../../shared/api/strips';
import { duplicateStrip, stripQuery } from '../api/strips';
import { Notice } from '../components/notice';
import { useToast } from '../components/toast';
import { readAddressDraft } from '../features/strip-editor/state/address-draft';
import { readDraft } from '../features/strip-editor/state/draft-storage';
import { StripEditor, type StripEditorProps } from '../features/strip-editor/strip-editor';
import { LoadingStrip } from '../features/strip-editor/components/loading-strip';
import { paths } from '../lib/paths';

interface Start {
  initial: StripParameters;
  origin: StripEditorProps['origin'];
  damaged: boolean;
}

/** What the address carries comes first, then what this tab kept, then what was saved. */
function startOf(strip: Strip | null, hash: string): Start {
  const address = readAddressDraft(hash);
  if (address.kind === 'draft') return { initial: address.parameters, origin: 'address', damaged: false };
  const damaged = address.kind === 'damaged';
  const saved = strip?.parameters ?? parseStripParameters({});
  const kept = readDraft(strip?.id ?? null);
  if (kept && JSON.stringify(kept.parameters) !== JSON.stringify(saved)) {
    return { initial: kept.parameters, origin: 'keptDraft', damaged };
  }
  return { initial: saved, origin: 'saved', damaged };
}

function Editor({ strip }: { strip: Strip | null }) {
  const navigate = useNavigate();
  const toast = useToast();
  const { hash } = useLocation();
  // Decided once: later changes of the address are the editor's own.
  const [start] = useState(() => startOf(strip, hash));
  const openStrip = (one: Strip): void => void navigate(paths.strip(one.id));
  const duplicate = async (): Promise<void> => {
    if (!strip) return;
    const copy = await duplicateStrip(strip.id);
    toast('Duplicated');
    openStrip(copy);
  };
  return (
    <>
      {start.damaged && (
        <div className="px-4 pt-3 tablet:px-6">
          <Notice kind="amber" title="The draft in the address cannot be read.">
            It is damaged or comes from a newer version. This is a plain strip instead.
          </Notice>
        </div>
      )}
      <StripEditor
        strip={strip}
        initial={start.initial}
        origin={start.origin}
        onSavedAs={openStrip}
        onDuplicate={() => void duplicate()}
      />
    </>
  );
}

function SavedStripPage({ stripId }: { stripId: string }) {
  const { data: strip } = useQuery({ ...stripQuery(stripId), throwOnError: true });
  // The editor keeps what it was opened with; a background refresh does not pull the page from under it.
  return strip ? <Editor key={strip.id} strip={strip} /> : <LoadingStrip durationS={10} tint="rose" />;
}

/** The strip editor, for a new strip or a saved one. */
export function Component() {
  const { stripId } = useParams();
  return stripId ? <SavedStripPage stripId={stripId} /> : <Editor key="new" strip={null} />;
}
