import { useId, type InputHTMLAttributes, type Ref } from 'react';
import { classNames } from '../lib/class-names';
import { FieldError } from './field-frame';

interface TextFieldProps extends Omit<InputHTMLAttributes<HTMLInputElement>, 'className'> {
  label: string;
  help?: string;
  error?: string;
  large?: boolean;
  /** Something at the right end, such as a button. */
  end?: React.ReactNode;
  ref?: Ref<HTMLInputElement>;
}

const box = 'w-full rounded-control border bg-sheet px-3 text-body';

export function TextField({ label, help, error, large, end, ...rest }: TextFieldProps) {
  const id = useId();
  return (
    <div>
      <label htmlFor={id} className="mb-1 block text-body font-medium">
        {label}
      </label>
      <div className="relative">
        <input
          id={id}
          aria-invalid={Boolean(error)}
          aria-describedby={error ? `${id}-error` : help ? `${id}-help` : undefined}
          className={classNames(
            box,
            large ? 'h-11' : 'h-9 pointer-coarse:h-11',
            error ? 'border-red' : 'border-edge',
            Boolean(end) && 'pr-16',
          )}
          {...rest}
        />
        {end && <div className="absolute inset-y-0 right-2 flex items-center">{end}</div>}
      </div>
      {error && <FieldError id={`${id}-error`}>{error}</FieldError>}
      {help && !error && (
        <p id={`${id}-help`} className="mt-1 text-caption text-ink-3">
          {help}
        </p>
      )}
    </div>
  );
}

interface TextAreaProps {
  label: string;
  help?: string;
  error?: string;
  rows?: number;
  name: string;
  onChange: React.ChangeEventHandler<HTMLTextAreaElement>;
  onBlur: React.FocusEventHandler<HTMLTextAreaElement>;
  ref?: Ref<HTMLTextAreaElement>;
}

export function TextArea({ label, help, error, rows = 3, ...rest }: TextAreaProps) {
  const id = useId();
  return (
    <div>
      <label htmlFor={id} className="mb-1 block text-body font-medium">
        {label}
      </label>
      <textarea
        id={id}
        rows={rows}
        aria-invalid={Boolean(error)}
        aria-describedby={error ? `${id}-error` : undefined}
        className={classNames(box, 'py-2', error ? 'border-red' : 'border-edge')}
        {...rest}
      />
      {error && <FieldError id={`${id}-error`}>{error}</FieldError>}
      {help && !error && <p className="mt-1 text-caption text-ink-3">{help}</p>}
    </div>
  );
}
