import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import en from '../locales/en/marks.json';
import es from '../locales/es/marks.json';
import { Mark } from './mark';
import { isMarkName, markNames } from './mark-names';
import { StateWord } from './state-word';

describe('StateWord', () => {
  it.each(markNames)('%s has a drawing, and a word in English and in Spanish', (name) => {
    expect(Object.hasOwn(en, name) && Object.hasOwn(es, name)).toBe(true);
    const { container } = render(<StateWord state={name} />);
    expect(container.querySelector('svg')?.childElementCount).toBeGreaterThan(0);
    expect(container.textContent).not.toBe('');
    expect(container.textContent).not.toContain(`marks`);
  });

  it('lets a visit say what is missing, in the tone it is given', () => {
    render(<StateWord state="booked" word="water not up" tone="brass" />);
    expect(screen.getByText('water not up').closest('.st')).toHaveClass('t-brass');
  });

  it('knows its names from other codes', () => {
    expect(isMarkName('awaiting-visit')).toBe(true);
    expect(isMarkName('closed')).toBe(false);
    expect(isMarkName('toString')).toBe(false);
  });

  it('reads a mark aloud only when nothing beside it does', () => {
    const { rerender, container } = render(<Mark name="fail" />);
    expect(container.querySelector('svg')).toHaveAttribute('aria-hidden', 'true');
    rerender(<Mark name="fail" title="fail" />);
    expect(screen.getByRole('img', { name: 'fail' })).toBeVisible();
  });

  it('numbers a correction until it is accepted', () => {
    const { rerender, container } = render(<Mark name="correction-open" number={3} />);
    expect(container.querySelector('text')).toHaveTextContent('3');
    rerender(<Mark name="correction-accepted" number={3} />);
    expect(container.querySelector('text')).toBeNull();
  });
});
