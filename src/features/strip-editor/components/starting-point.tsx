import { courseGroups } from '../../../../shared/gallery/course';
import { gallery, presetParameters } from '../../../../shared/gallery/gallery';
import type { StripParameters } from '../../../../shared/parameters/strip-parameters';
import { buttonClass } from '../../../components/button';
import { Chevron } from '../../../components/select-field';
import { Menu, MenuItem, MenuLabel } from '../../../components/menu';

/** A preset of the gallery as a starting point; one undo takes it back. */
export function StartingPoint({ onApply }: { onApply(parameters: StripParameters): void }) {
  return (
    <div className="flex justify-end px-4 pb-2 tablet:px-6">
      <Menu
        label="Start from a preset"
        trigger={
          <span className={buttonClass('quiet', true)}>
            Start from a preset <Chevron />
          </span>
        }
      >
        <div className="max-h-96 overflow-y-auto">
          {courseGroups.map((group) => {
            const presets = gallery.filter((preset) => preset.group === group.id);
            if (presets.length === 0) return null;
            return (
              <div key={group.id}>
                <MenuLabel>
                  <span className="text-caption text-ink-3">{group.title}</span>
                </MenuLabel>
                {presets.map((preset) => (
                  <MenuItem key={preset.id} onSelect={() => onApply(presetParameters(preset))}>
                    {preset.title}
                  </MenuItem>
                ))}
              </div>
            );
          })}
        </div>
      </Menu>
    </div>
  );
}
