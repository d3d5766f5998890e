import type { ReactNode } from 'react';
import { parameterApplies } from '../../../../shared/parameters/applies';
import type { ParametersEditor } from '../state/use-parameters';
import { ParameterField } from './parameter-field';
import type { Section } from './sections';

/** Fields side by side, as many as the width allows. */
export function FieldGrid({ children }: { children: ReactNode }) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-x-9 gap-y-5 tablet:grid-cols-2 wide:grid-cols-3">
      {children}
    </div>
  );
}

interface FieldSectionProps {
  editor: ParametersEditor;
  section: Section;
}

/** The fields of a section that apply to this strip; nothing when none does. */
export function FieldSection({ editor, section }: FieldSectionProps) {
  const paths = section.paths.filter((path) => parameterApplies(editor.parameters, path));
  if (paths.length === 0) return null;
  return (
    <section className="mt-6 first:mt-0">
      {section.title && (
        <h3 className="mb-3 border-b border-rule pb-1 text-dense font-semibold text-ink-2">
          {section.title}
        </h3>
      )}
      <FieldGrid>
        {paths.map((path) => (
          <ParameterField key={path} editor={editor} path={path} />
        ))}
      </FieldGrid>
    </section>
  );
}

/** All sections of a group, one under the other. */
export function FieldSections({
  editor,
  sections,
}: {
  editor: ParametersEditor;
  sections: readonly Section[];
}) {
  return sections.map((section) => (
    <FieldSection key={section.title ?? section.paths[0]} editor={editor} section={section} />
  ));
}
