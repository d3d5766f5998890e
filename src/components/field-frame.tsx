import type { ReactNode } from 'react';

interface FieldFrameProps {
  label: string;
  help?: string;
  error?: string;
  children: ReactNode;
}

/** Label, control, one sentence of help, error in words. */
export function FieldFrame({ label, help, error, children }: FieldFrameProps) {
  return (
    <div className="min-w-0">
      <p className="mb-1.5 text-body font-medium">{label}</p>
      {children}
      {error && <FieldError>{error}</FieldError>}
      {help && <p className="mt-1.5 text-caption text-ink-3">{help}</p>}
    </div>
  );
}

export function FieldError({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <p id={id} role="alert" className="mt-1.5 flex gap-1.5 text-dense text-red">
      <span aria-hidden="true" className="font-semibold">
        ×
      </span>
      <span>{children}</span>
    </p>
  );
}
