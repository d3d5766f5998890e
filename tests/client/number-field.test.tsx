import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { NumberField, rulerStep, showNumber } from '../../src/components/number-field';

afterEach(cleanup);

/** A field as the editor uses it, with a plain parser. */
function Field({ onCommit, nullable }: { onCommit?: () => void; nullable?: boolean }) {
  const [value, setValue] = useState<number | null>(180);
  return (
    <NumberField
      label="AV delay"
      unit="ms"
      value={value}
      min={30}
      max={350}
      usual={[150, 200]}
      help="From one stimulus to the next."
      nullable={nullable}
      emptyWords="as the model gives"
      parse={(text) =>
        Promise.resolve(
          Number.isNaN(Number(text)) ? { error: `“${text}” is not a number.` } : { value: Number(text) },
        )
      }
      onChange={setValue}
      onCommit={onCommit ?? (() => undefined)}
    />
  );
}

const box = () => screen.getByRole('textbox', { name: 'AV delay' }) as HTMLInputElement;

describe('number field', () => {
  it('takes a typed value on Enter, once', async () => {
    const onCommit = vi.fn();
    render(<Field onCommit={onCommit} />);
    await userEvent.clear(box());
    await userEvent.type(box(), '200{Enter}');
    expect(box().value).toBe('200');
    expect(onCommit).toHaveBeenCalledTimes(1);
  });

  it.each([
    ['400', '400 ms is above 350 ms, the most allowed. The strip still shows 180 ms.'],
    ['5', '5 ms is below 30 ms, the least allowed. The strip still shows 180 ms.'],
    ['soon', '“soon” is not a number.'],
  ])('refuses %s in words and marks the field', async (text, words) => {
    render(<Field />);
    await userEvent.clear(box());
    await userEvent.type(box(), `${text}{Enter}`);
    expect(screen.getByRole('alert').textContent).toContain(words);
    expect(box().getAttribute('aria-invalid')).toBe('true');
    await userEvent.type(box(), '{Escape}');
    expect(box().value).toBe('180');
    expect(screen.queryByRole('alert')).toBeNull();
  });

  it('can be emptied where null is a value', async () => {
    render(<Field nullable />);
    await userEvent.clear(box());
    await userEvent.type(box(), '{Enter}');
    expect(box().placeholder).toBe('as the model gives');
  });

  it('moves with the arrow keys on its ruler', async () => {
    render(<Field />);
    screen.getByRole('slider', { name: 'AV delay, ruler' }).focus();
    await userEvent.keyboard('{ArrowRight}');
    expect(box().value).toBe('182');
  });
});

describe('rulers', () => {
  it('step by 1, 2 or 5', () => {
    expect([rulerStep(30, 350), rulerStep(0, 10), rulerStep(0, 1), rulerStep(0, 4294967295, true)]).toEqual([
      2, 0.05, 0.005, 50_000_000,
    ]);
  });

  it('show no more decimals than a number needs', () => {
    expect([showNumber(0.1 + 0.2), showNumber(180), showNumber(0.075)]).toEqual(['0.3', '180', '0.075']);
  });
});
