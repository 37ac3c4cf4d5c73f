import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { DateField } from '@/components/ui/date-field';
import { TextField } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { TagsField } from '@/components/ui/tags-field';

const nothing = () => undefined;
const describedBy = (control: HTMLElement) =>
  (control.getAttribute('aria-describedby') ?? '')
    .split(' ')
    .map((id) => document.getElementById(id)?.textContent ?? '')
    .join(' | ');

describe('TextField', () => {
  it('is found by its label and described by its hint and unit', () => {
    render(
      <TextField label="Credit" value="0.55" onChangeText={nothing} suffix="a share" hint="Market 0.53 to 0.59" />,
    );
    const input = screen.getByLabelText('Credit');
    expect(describedBy(input)).toBe('Market 0.53 to 0.59 | a share');
    expect(input.getAttribute('aria-invalid')).toBeNull();
  });

  it('announces an error: invalid, described by it, in an alert that was there before', () => {
    const { rerender } = render(<TextField label="Sessions" value="-3" onChangeText={nothing} />);
    const alert = screen.getByRole('alert');
    expect(alert.textContent).toBe('');
    rerender(<TextField label="Sessions" value="-3" onChangeText={nothing} error="Must be above 0." />);
    const input = screen.getByLabelText('Sessions');
    expect(input.getAttribute('aria-invalid')).toBe('true');
    expect(describedBy(input)).toBe('Must be above 0.');
    expect(alert.textContent).toBe('Must be above 0.');
  });

  it('keeps a hidden label for screen readers', () => {
    render(<TextField label="Search entries" hideLabel value="" onChangeText={nothing} />);
    expect(screen.getByRole('textbox', { name: 'Search entries' })).toBeTruthy();
  });

  it('covers a password until it is asked to show it', () => {
    render(<TextField label="Password" secureTextEntry value="three words long" onChangeText={nothing} />);
    const input = screen.getByLabelText('Password');
    expect(input.getAttribute('type')).toBe('password');
    fireEvent.click(screen.getByRole('button', { name: 'Show password' }));
    expect(input.getAttribute('type')).not.toBe('password');
  });
});

describe('SelectField', () => {
  it('hands on the option that was chosen', () => {
    const onChange = jest.fn();
    const options = [
      { value: 'buy', label: 'Buy' },
      { value: 'sell', label: 'Sell' },
    ] as const;
    render(<SelectField label="Act" value="buy" options={options} onChange={onChange} error="Choose one." />);
    const select = screen.getByLabelText('Act');
    fireEvent.change(select, { target: { value: 'sell' } });
    expect(onChange).toHaveBeenCalledWith('sell');
    expect(describedBy(select)).toBe('Choose one.');
  });

  it('shows that nothing is chosen when the value is none of the options', () => {
    render(<SelectField label="Underlying" value="" options={[{ value: 'JQVO', label: 'JQVO' }]} onChange={nothing} />);
    expect(screen.getByLabelText<HTMLSelectElement>('Underlying').selectedOptions[0]?.textContent).toBe('Choose');
  });
});

describe('DateField', () => {
  it('takes ISO dates and writes the chosen one out in words', () => {
    const onChange = jest.fn();
    render(<DateField label="Exit" value="2026-12-09" onChange={onChange} />);
    const input = screen.getByLabelText('Exit');
    expect(describedBy(input)).toBe('Wednesday 9 December 2026');
    fireEvent.change(input, { target: { value: '2026-12-18' } });
    expect(onChange).toHaveBeenCalledWith('2026-12-18');
  });
});

function Tags() {
  const [tags, setTags] = useState<string[]>(['earnings']);
  return <TagsField label="Tags" value={tags} onChange={setTags} />;
}

describe('TagsField', () => {
  const tags = () => screen.getAllByRole('button').map((button) => button.getAttribute('aria-label'));

  it('adds each new word once, by comma and when the field is left', () => {
    render(<Tags />);
    const input = screen.getByLabelText('Tags');
    fireEvent.change(input, { target: { value: 'late  entry,' } });
    fireEvent.change(input, { target: { value: 'earnings' } });
    fireEvent.blur(input);
    expect(tags()).toEqual(['Take off earnings', 'Take off late entry']);
  });

  it('takes the last one off on Backspace in the empty field', () => {
    render(<Tags />);
    fireEvent.keyDown(screen.getByLabelText('Tags'), { key: 'Backspace' });
    expect(screen.queryAllByRole('button')).toEqual([]);
  });
});
