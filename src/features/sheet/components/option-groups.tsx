import type { ReactNode } from 'react';
import type { PageSetup } from '../../../../shared/parameters/page-setup';
import { leadNames, type LeadName } from '../../../../shared/parameters/sheet';
import { Tag } from '../../../components/chip';
import { Segments } from '../../../components/segments';
import { SelectField } from '../../../components/select-field';

/** Changes some options. */
export type ChangeSetup = (change: Partial<PageSetup>) => void;

/** A group of options under its heading. */
export function OptionGroup({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section aria-label={title} className="flex flex-col gap-2">
      <h2 className="text-body font-semibold">{title}</h2>
      {children}
    </section>
  );
}

/** Segments over the whole width, for values that are no text. */
export function ValueSegments<T extends string | number | null>({
  label,
  value,
  options,
  onChange,
}: {
  label: string;
  value: T;
  options: readonly (readonly [T, string])[];
  onChange(value: T): void;
}) {
  return (
    <Segments
      small
      stretched
      label={label}
      value={String(value)}
      options={options.map(([one, words]) => ({ value: String(one), label: words }))}
      onChange={(next) => {
        const found = options.find(([one]) => String(one) === next);
        if (found) onChange(found[0]);
      }}
    />
  );
}

/** A small label above a control of a group. */
export function Caption({ children }: { children: ReactNode }) {
  return <p className="-mb-1 text-caption text-ink-3">{children}</p>;
}

/** The one lead of a sheet, or the leads in the order they are drawn in. */
export function LeadChoice({
  several,
  leads,
  onChange,
}: {
  several: boolean;
  leads: readonly LeadName[];
  onChange: ChangeSetup;
}) {
  if (!several) {
    return (
      <SelectField
        label="Lead"
        value={leads[0]}
        options={leadNames.map((lead) => ({ value: lead, label: `Lead ${lead}` }))}
        onChange={(lead) => onChange({ leads: [lead] })}
      />
    );
  }
  const toggle = (lead: LeadName): void => {
    const without = leads.filter((one) => one !== lead);
    if (without.length === leads.length) onChange({ leads: [...leads, lead] });
    else if (without.length > 0) onChange({ leads: without });
  };
  return (
    <>
      <div role="group" aria-label="Leads" className="flex flex-wrap gap-1.5">
        {leadNames.map((lead) => (
          <Tag key={lead} chosen={leads.includes(lead)} onClick={() => toggle(lead)}>
            {lead}
          </Tag>
        ))}
      </div>
      <p className="text-caption text-ink-3">
        From the top: {leads.join(', ')}.{' '}
        {leads.length === 1 ? 'At least one stays.' : 'A lead chosen anew goes below the others.'}
      </p>
    </>
  );
}
