import { act, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Segmented } from '@/components/ui/segmented';
import { StepBar } from '@/components/ui/step-bar';

const drifts = [
  { value: 'zero', label: 'Zero return' },
  { value: 'neutral', label: 'Risk-neutral' },
  { value: 'own', label: 'My view' },
] as const;

function Drift() {
  const [value, setValue] = useState<(typeof drifts)[number]['value']>('zero');
  return <Segmented label="Drift" options={drifts} value={value} onChange={setValue} />;
}

function Planner({ reached }: { reached: number }) {
  const [current, setCurrent] = useState(0);
  return <StepBar steps={['Move', 'Structure', 'Seal']} current={current} reached={reached} onGo={setCurrent} />;
}

const checked = () => screen.getAllByRole('radio').map((radio) => radio.getAttribute('aria-checked'));
const selected = () => screen.getAllByRole('tab').map((tab) => tab.getAttribute('aria-selected'));
const press = (key: string) => fireEvent.keyDown(document.activeElement ?? document.body, { key });

describe('Segmented', () => {
  it('is a named radio group with one tab stop', () => {
    render(<Drift />);
    expect(screen.getByRole('radiogroup', { name: 'Drift' })).toBeTruthy();
    expect(screen.getAllByRole('radio').map((radio) => radio.tabIndex)).toEqual([0, -1, -1]);
  });

  it('moves choice and focus with the arrows, round the ends, and with Home and End', () => {
    render(<Drift />);
    act(() => screen.getByRole('radio', { name: 'Zero return' }).focus());
    press('ArrowRight');
    expect(checked()).toEqual(['false', 'true', 'false']);
    expect(document.activeElement).toBe(screen.getByRole('radio', { name: 'Risk-neutral' }));
    press('End');
    press('ArrowDown');
    expect(checked()).toEqual(['true', 'false', 'false']);
    press('ArrowLeft');
    expect(checked()).toEqual(['false', 'false', 'true']);
  });
});

describe('a row of choices with none chosen', () => {
  it('begins at the last when going backwards', () => {
    const onChange = jest.fn();
    render(<Segmented<string> label="Drift" options={drifts} value="none" onChange={onChange} />);
    fireEvent.keyDown(screen.getByRole('radiogroup', { name: 'Drift' }), { key: 'ArrowLeft' });
    expect(onChange).toHaveBeenCalledWith('own');
  });
});

describe('StepBar', () => {
  it('goes by arrows only to steps that were reached', () => {
    render(<Planner reached={1} />);
    act(() => screen.getByRole('tab', { name: 'Move' }).focus());
    press('ArrowRight');
    expect(selected()).toEqual(['false', 'true', 'false']);
    press('ArrowRight');
    expect(selected()).toEqual(['true', 'false', 'false']);
    press('End');
    expect(selected()).toEqual(['false', 'true', 'false']);
  });

  it('does not open a step that was not reached', () => {
    render(<Planner reached={1} />);
    fireEvent.click(screen.getByRole('tab', { name: 'Seal' }));
    expect(selected()).toEqual(['true', 'false', 'false']);
  });
});
