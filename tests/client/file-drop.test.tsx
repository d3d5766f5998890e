import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { FileDrop } from '../../src/components/file-drop';

afterEach(cleanup);

const file = new File(['{}'], 'presets.json', { type: 'application/json' });

function show(busy?: string) {
  const onFile = vi.fn();
  render(<FileDrop text="Drop it here" accept=".json" label="Choose a file" busy={busy} onFile={onFile} />);
  return onFile;
}

describe('a place for a file', () => {
  it('takes what is dropped on it, and lets nothing dropped beside it leave the page', () => {
    const onFile = show();
    // False: the browser's own handling was prevented.
    expect(fireEvent.drop(screen.getByText('Drop it here'), { dataTransfer: { files: [file] } })).toBe(false);
    expect(onFile).toHaveBeenCalledExactlyOnceWith(file);
    expect(fireEvent.drop(document.body, { dataTransfer: { files: [file] } })).toBe(false);
    expect(onFile).toHaveBeenCalledTimes(1);
  });

  it('takes the same file again, since it may have changed', async () => {
    const onFile = show();
    const input = screen.getByLabelText<HTMLInputElement>('Choose a file', { selector: 'input' });
    await userEvent.upload(input, file);
    expect(input.value).toBe('');
    await userEvent.upload(input, file);
    expect(onFile).toHaveBeenCalledTimes(2);
  });

  it('opens the chooser by keyboard', async () => {
    show();
    const opened = vi.spyOn(HTMLInputElement.prototype, 'click');
    await userEvent.tab();
    expect(document.activeElement?.textContent).toBe('Choose a file');
    await userEvent.keyboard('{Enter}');
    expect(opened).toHaveBeenCalledTimes(1);
    opened.mockRestore();
  });

  it('takes nothing while it is busy, and says so', () => {
    const onFile = show('Reading the file …');
    expect(screen.getByRole('button', { name: 'Reading the file …' }).hasAttribute('disabled')).toBe(true);
    fireEvent.drop(screen.getByText('Drop it here'), { dataTransfer: { files: [file] } });
    expect(onFile).not.toHaveBeenCalled();
  });
});
