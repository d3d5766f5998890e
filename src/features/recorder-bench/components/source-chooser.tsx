import { courseGroups } from '../../../../shared/gallery/course';
import { gallery } from '../../../../shared/gallery/gallery';
import { testSignalIds, testSignals } from '../../../../shared/recorder-bench/test-signals';
import { buttonClass } from '../../../components/button';
import { Menu, MenuItem, MenuLabel } from '../../../components/menu';
import { Chevron } from '../../../components/select-field';
import type { BenchSource } from '../state/bench-address';

interface SourceChooserProps {
  title: string;
  /** The person's own and the department's strips; empty for learners. */
  strips: readonly { id: string; title: string }[];
  onChoose(source: BenchSource): void;
}

function Heading({ children }: { children: string }) {
  return (
    <MenuLabel>
      <span className="text-caption text-ink-3">{children}</span>
    </MenuLabel>
  );
}

/** A strip of the department, one of the gallery, or a standard test signal. */
export function SourceChooser({ title, strips, onChoose }: SourceChooserProps) {
  return (
    <Menu
      label={`On the bench: ${title}. Choose another`}
      trigger={
        <span className={`${buttonClass('plain')} max-w-[min(26rem,80vw)]`}>
          <span className="truncate">{title}</span>
          <Chevron />
        </span>
      }
    >
      <div className="max-h-[min(26rem,70dvh)] max-w-[min(26rem,88vw)] overflow-y-auto">
        <Heading>Test signals</Heading>
        {testSignalIds.map((id) => (
          <MenuItem key={id} onSelect={() => onChoose({ kind: 'signal', id })}>
            {testSignals[id].label}
          </MenuItem>
        ))}
        {strips.length > 0 && <Heading>Your department’s strips</Heading>}
        {strips.map(({ id, title: name }) => (
          <MenuItem key={id} onSelect={() => onChoose({ kind: 'strip', id })}>
            {name}
          </MenuItem>
        ))}
        {courseGroups.map((group) => (
          <div key={group.id}>
            <Heading>{group.title}</Heading>
            {gallery
              .filter((preset) => preset.group === group.id)
              .map((preset) => (
                <MenuItem key={preset.id} onSelect={() => onChoose({ kind: 'preset', id: preset.id })}>
                  {preset.title}
                </MenuItem>
              ))}
          </div>
        ))}
      </div>
    </Menu>
  );
}
