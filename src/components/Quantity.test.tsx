// @vitest-environment jsdom
// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { Quantity } from './Quantity.tsx';

afterEach(cleanup);

type Limits = {
  min?: number;
  max?: number;
  below?: boolean;
  step?: number;
  whole?: boolean;
  readOnly?: boolean;
};

/** A quantity whose value lives outside, as on the drawing. */
function setUp(start: number, limits: Limits = {}) {
  const changes = vi.fn();
  function Host() {
    const [value, setValue] = useState(start);
    const take = (next: number) => {
      changes(next);
      setValue(next);
    };
    return <Quantity label="thickness of Pt" unit="nm" value={value} onChange={take} {...limits} />;
  }
  render(<Host />);
  return { changes, user: userEvent.setup() };
}

const field = () => screen.getByRole<HTMLInputElement>('spinbutton', { name: 'thickness of Pt (nm)' });

describe('Quantity', () => {
  it('passes every permitted keystroke on at once', async () => {
    const { changes, user } = setUp(3);
    await user.click(field());
    await user.keyboard('{Control>}a{/Control}12.5');
    // "12." is the number 12 again, so it changes nothing.
    expect(changes.mock.calls.flat()).toEqual([1, 12, 12.5]);
    expect(field().value).toBe('12.5');
  });

  it('reads a decimal comma and a typographic minus', async () => {
    const { changes, user } = setUp(3);
    await user.clear(field());
    await user.type(field(), '−0,5');
    expect(changes).toHaveBeenLastCalledWith(-0.5);
  });

  it('says why a value is refused, keeps the old one, and names the problem for screen readers', async () => {
    const { changes, user } = setUp(3, { min: 0 });
    await user.clear(field());
    await user.type(field(), '-2');
    expect(changes).not.toHaveBeenCalledWith(-2);
    expect(screen.getByRole('alert').textContent).toBe('Must be at least 0');
    expect(field().getAttribute('aria-invalid')).toBe('true');
    expect(field().getAttribute('aria-describedby')).toBe(screen.getByRole('alert').id);
    await user.tab();
    expect(field().value).toBe('3');
    expect(screen.getByRole('alert').textContent).toBe('Must be at least 0');
    await user.click(field());
    expect(screen.queryByRole('alert')).toBeNull();
  });

  it('refuses text, an empty field, a fraction where whole numbers are asked for, and the open upper end', async () => {
    const { changes, user } = setUp(3, { whole: true, max: 90, below: true });
    const type = async (text: string) => {
      await user.clear(field());
      await user.type(field(), text);
      return screen.getByRole('alert').textContent;
    };
    await user.clear(field());
    expect(screen.getByRole('alert').textContent).toBe('Type a number');
    expect(await type('x')).toBe('This is not a number');
    expect(await type('0.5')).toBe('Must be a whole number');
    expect(await type('90')).toBe('Must be less than 90');
    expect(changes).not.toHaveBeenCalledWith(90);
    expect(changes).not.toHaveBeenCalledWith(0.5);
  });

  it('goes back to the value at focus on Escape', async () => {
    const { changes, user } = setUp(3);
    await user.click(field());
    await user.keyboard('{Control>}a{/Control}77');
    await user.keyboard('{Escape}');
    expect(changes).toHaveBeenLastCalledWith(3);
    expect(field().value).toBe('3');
  });

  it('steps by arrows without binary noise, ten times with Shift, a tenth with Alt, and stops at its ends', async () => {
    const { changes, user } = setUp(0.1, { step: 0.1, min: 0 });
    await user.click(field());
    await user.keyboard('{ArrowUp}{ArrowUp}');
    expect(changes.mock.calls.flat()).toEqual([0.2, 0.3]);
    await user.keyboard('{Shift>}{ArrowUp}{/Shift}');
    expect(changes).toHaveBeenLastCalledWith(1.3);
    await user.keyboard('{Alt>}{ArrowDown}{/Alt}');
    expect(changes).toHaveBeenLastCalledWith(1.29);
    await user.keyboard('{Shift>}{ArrowDown}{ArrowDown}{/Shift}');
    expect(changes).toHaveBeenLastCalledWith(0);
  });

  it('ignores the wheel', async () => {
    const { changes, user } = setUp(3);
    await user.click(field());
    fireEvent.wheel(field(), { deltaY: 100 });
    expect(changes).not.toHaveBeenCalled();
    expect(field().value).toBe('3');
  });

  it('is text for people who may not change it', () => {
    setUp(3, { readOnly: true });
    expect(screen.queryByRole('spinbutton')).toBeNull();
    expect(document.body.textContent).toContain('3nm');
  });
});
