import type { FormEvent, ReactElement } from 'react';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it, vi } from 'vitest';
import { Act } from './act';

describe('Act', () => {
  it('does what it says', async () => {
    const press = vi.fn();
    render(<Act onClick={press}>Book 3 visits</Act>);
    await userEvent.click(screen.getByRole('button', { name: 'Book 3 visits' }));
    expect(press).toHaveBeenCalledTimes(1);
  });

  it('that cannot be done yet says why, can be reached, and does nothing', async () => {
    const press = vi.fn();
    const submit = vi.fn((event: FormEvent) => event.preventDefault());
    render(
      <form onSubmit={submit}>
        <Act kind="first" type="submit" cannotYet="photo missing" onClick={press}>
          Save and say test up
        </Act>
      </form>,
    );
    const act = screen.getByRole('button', { name: /Save and say test up.*photo missing/ });
    await userEvent.tab();
    expect(act).toHaveFocus();
    expect(act).toHaveAttribute('aria-disabled', 'true');
    await userEvent.keyboard('{Enter}');
    await userEvent.click(act);
    expect(press).not.toHaveBeenCalled();
    expect(submit).not.toHaveBeenCalled();
  });

  it('on its way ignores a second press', async () => {
    const press = vi.fn();
    render(
      <Act busy busyWord="Booking" onClick={press}>
        Book
      </Act>,
    );
    await userEvent.click(screen.getByRole('button', { name: 'Booking' }));
    expect(press).not.toHaveBeenCalled();
  });

  it('that goes somewhere is a link, unless it cannot be done yet', () => {
    const page = (why?: string): ReactElement => (
      <MemoryRouter>
        <Act to="/lots/17" cannotYet={why}>
          Open lot 17
        </Act>
      </MemoryRouter>
    );
    const { rerender } = render(page());
    expect(screen.getByRole('link', { name: 'Open lot 17' })).toHaveAttribute('href', '/lots/17');
    rerender(page('no signal'));
    expect(screen.queryByRole('link')).toBeNull();
    expect(screen.getByRole('button')).toHaveAttribute('aria-disabled', 'true');
  });
});
