import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState, type ReactNode } from 'react';
import { describe, expect, it } from 'vitest';
import { Answers, type Answer } from './answers';
import { Choice } from './choice';

type Needle = 'fell' | 'stayed' | 'jumped';

function Needles({ off }: { off?: Needle }): ReactNode {
  const [value, setValue] = useState<Needle | null>(null);
  const options = (['fell', 'stayed', 'jumped'] as const).map((one) => ({
    value: one,
    label: one,
    isOff: one === off,
  }));
  return <Choice label="The needle" options={options} value={value} onChange={setValue} />;
}

// Keys as in the radio group pattern of the ARIA Authoring Practices Guide (W3C).
describe('Choice', () => {
  it('is one group with one stop for Tab; arrows choose and go round', async () => {
    render(<Needles />);
    expect(screen.getByRole('radiogroup', { name: 'The needle' })).toBeVisible();
    await userEvent.click(screen.getByRole('radio', { name: 'fell' }));
    await userEvent.keyboard('{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'stayed' })).toBeChecked();
    await userEvent.keyboard('{ArrowRight}{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'fell' })).toBeChecked();
    await userEvent.keyboard('{ArrowLeft}');
    expect(screen.getByRole('radio', { name: 'jumped' })).toBeChecked();
    await userEvent.tab();
    expect(document.body).toHaveFocus();
  });

  it('dimensions the chosen one and passes over one that cannot be chosen', async () => {
    render(<Needles off="stayed" />);
    await userEvent.click(screen.getByRole('radio', { name: 'fell' }));
    expect(screen.getByText('fell').closest('label')).toHaveClass('on');
    await userEvent.keyboard('{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'jumped' })).toBeChecked();
    expect(screen.getByText('fell').closest('label')).not.toHaveClass('on');
  });
});

function WaterAnswer(): ReactNode {
  const [value, setValue] = useState<Answer | null>(null);
  return <Answers label="Water" value={value} onChange={setValue} />;
}

describe('Answers', () => {
  it('starts with none given and takes one of three', async () => {
    render(<WaterAnswer />);
    const all = screen.getAllByRole('radio');
    expect(all).toHaveLength(3);
    all.forEach((radio) => expect(radio).not.toBeChecked());
    await userEvent.click(screen.getByRole('radio', { name: 'not seen' }));
    expect(screen.getByRole('radio', { name: 'not seen' })).toBeChecked();
  });
});
