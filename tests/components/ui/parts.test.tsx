import { act, fireEvent, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';

import { AnswerAsks, AnswerStrip } from '@/components/ui/AnswerStrip';
import { Button } from '@/components/ui/Button';
import { Disclosure } from '@/components/ui/Disclosure';
import { Field, NumberField } from '@/components/ui/Field';
import { RichText } from '@/components/ui/RichText';
import { Segments } from '@/components/ui/Segments';
import { Select } from '@/components/ui/Select';
import { Sheet } from '@/components/ui/Sheet';
import { Table } from '@/components/ui/Table';
import { Text } from '@/components/ui/Text';
import { GRADES } from '@/shared/types/answer';

describe('Button', () => {
  it('is never dead without a reason that is read with it', async () => {
    const press = jest.fn();
    render(<Button label="Sign" onPress={press} disabledBecause="Query 1 is open." />);
    const button = screen.getByRole('button', { name: 'Sign' });
    expect(button.getAttribute('aria-disabled')).toBe('true');
    expect(document.getElementById(button.getAttribute('aria-describedby')!)?.textContent).toBe('Query 1 is open.');
    fireEvent.click(button);
    expect(press).not.toHaveBeenCalled();
  });

  it('keeps its name while busy and takes no second press', async () => {
    const press = jest.fn();
    render(<Button label="Save" busy="saving" onPress={press} />);
    await userEvent.click(screen.getByRole('button'));
    expect(screen.getByRole('button').textContent).toContain('Save');
    expect(press).not.toHaveBeenCalled();
  });

  it('is pressed by the keyboard', async () => {
    const press = jest.fn();
    render(<Button label="Save" onPress={press} />);
    await userEvent.tab();
    await userEvent.keyboard('{Enter}');
    expect(press).toHaveBeenCalledTimes(1);
  });
});

describe('Field', () => {
  it('shows the sentence under the field, tied to it, with its mends', async () => {
    const mend = jest.fn();
    render(<Field label="_J_" value="0.0178" onChange={() => undefined} error="0.0178 looks like a distance in ppm." mends={[{ label: 'Use 8.9 Hz', onPress: mend }]} />);
    const field = screen.getByRole('textbox', { name: 'J' });
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(document.getElementById(field.getAttribute('aria-describedby')!)?.textContent).toBe('0.0178 looks like a distance in ppm.');
    expect((field as HTMLInputElement).value).toBe('0.0178');
    await userEvent.click(screen.getByRole('button', { name: 'Use 8.9 Hz, J' }));
    expect(mend).toHaveBeenCalled();
  });

  it('asks a phone for its number pad and speaks a formula as words', () => {
    render(<NumberField label="³_J_(H,H)" spoken="Measured three J H H, in hertz" value="" onChange={() => undefined} unit="Hz" />);
    expect(screen.getByRole('textbox', { name: 'Measured three J H H, in hertz' }).getAttribute('inputmode')).toBe('decimal');
  });
});

describe('Segments', () => {
  function Held() {
    const [value, setValue] = useState<'single' | 'double'>('single');
    return <Segments label="Kind of bond" value={value} onChange={setValue} options={[{ value: 'single', label: 'Single bond' }, { value: 'double', label: 'Double bond' }]} />;
  }
  it('is one stop of Tab, and arrow keys choose', async () => {
    render(<Held />);
    await userEvent.tab();
    expect(document.activeElement).toBe(screen.getByRole('radio', { name: 'Single bond' }));
    await userEvent.keyboard('{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'Double bond' }).getAttribute('aria-checked')).toBe('true');
    expect(document.activeElement).toBe(screen.getByRole('radio', { name: 'Double bond' }));
    await userEvent.keyboard('{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'Single bond' }).getAttribute('aria-checked')).toBe('true');
  });
});

describe('Sheet', () => {
  function Held() {
    const [open, setOpen] = useState(false);
    return (
      <>
        <Button label="Open" onPress={() => setOpen(true)} />
        {open && <Sheet title="Groups" onClose={() => setOpen(false)} actions={<Button label="Done" onPress={() => setOpen(false)} />}><Button label="Inside" onPress={() => undefined} /></Sheet>}
      </>
    );
  }
  it('takes the focus, holds it, and gives it back on Esc', async () => {
    render(<Held />);
    const opener = screen.getByRole('button', { name: 'Open' });
    await userEvent.click(opener);
    act(() => opener.focus());
    const dialog = screen.getByRole('dialog', { name: 'Groups' });
    act(() => within(dialog).getByRole('button', { name: 'Done' }).focus());
    await userEvent.tab();
    expect(dialog.contains(document.activeElement)).toBe(true);
    await userEvent.tab({ shift: true });
    expect(document.activeElement).toBe(within(dialog).getByRole('button', { name: 'Done' }));
    await userEvent.keyboard('{Escape}');
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(document.activeElement).toBe(opener);
  });

  it('closes by its cross', async () => {
    render(<Held />);
    await userEvent.click(screen.getByRole('button', { name: 'Open' }));
    await userEvent.click(screen.getByRole('button', { name: 'Close' }));
    expect(screen.queryByRole('dialog')).toBeNull();
  });
});

it('chooses one of many in a sheet', async () => {
  const change = jest.fn();
  render(<Select label="Role" value={null} placeholder="choose" onChange={change} options={[{ value: 'chemist', label: 'Chemist' }, { value: 'lead', label: 'Lead', disabledBecause: 'A guest is no lead.' }]} />);
  await userEvent.click(screen.getByRole('button', { name: 'Role choose' }));
  fireEvent.click(screen.getByRole('radio', { name: /Lead/ }));
  expect(change).not.toHaveBeenCalled();
  await userEvent.click(screen.getByRole('radio', { name: 'Chemist' }));
  expect(change).toHaveBeenCalledWith('chemist');
  expect(screen.queryByRole('dialog')).toBeNull();
});

describe('the answer strip', () => {
  it.each(GRADES)('says its grade in words, whatever the colour: %s', (grade) => {
    render(<AnswerStrip grade={grade} headline="Antiperiplanar, _φ_ 152° to 169°" detail="Still open: an eclipsed arc." />);
    const strip = screen.getByRole('region', { name: 'Calculated answer' });
    expect(strip.textContent?.startsWith(grade.replace('-', ' '))).toBe(true);
    expect(within(strip).getByRole('heading', { level: 2 }).textContent).toBe('Antiperiplanar, φ 152° to 169°');
  });

  it('names a person’s answer, and says when it is not the answer to what stands above', () => {
    render(<AnswerStrip grade="assigned" ink="judged" headline="2,3-trans" stale="This is the answer to the entry before." />);
    const strip = screen.getByRole('region', { name: 'Judged answer' });
    expect(strip.getAttribute('aria-busy')).toBe('true');
    expect(strip.textContent).toContain('This is the answer to the entry before.');
  });

  it('asks before there is an answer', () => {
    render(<AnswerAsks headline="Type a ³_J_ to begin" detail="Size only." />);
    expect(screen.getByRole('heading', { name: 'Type a ³J to begin' })).toBeTruthy();
  });
});

it('sets what stands between underscores in italics and nothing else', () => {
  const { container } = render(<RichText text="³_J_(H,H) against _φ_" />);
  const italics = [...container.querySelectorAll('span')].filter((node) => getComputedStyle(node).fontStyle === 'italic').map((node) => node.textContent);
  expect(italics).toEqual(['J', 'φ']);
  expect(container.textContent).toBe('³J(H,H) against φ');
});

it('makes a table with a name, column heads and row heads', () => {
  render(<Table caption="Roots" rows={[{ phi: '159°', sector: 'ap' }]} rowKey={(row) => row.phi} columns={[
    { key: 'phi', head: '_φ_', rowHeader: true, cell: (row) => row.phi }, { key: 'sector', head: 'Sector', cell: (row) => row.sector },
  ]} />);
  expect(screen.getByRole('table', { name: 'Roots' })).toBeTruthy();
  expect(screen.getByRole('rowheader', { name: '159°' })).toBeTruthy();
  expect(screen.getAllByRole('columnheader').map((head) => head.textContent)).toEqual(['φ', 'Sector']);
});

it('unfolds on press, and stays open while something inside needs attention', async () => {
  const { rerender } = render(<Disclosure label="More"><Text>inside</Text></Disclosure>);
  expect(screen.queryByText('inside')).toBeNull();
  await userEvent.click(screen.getByRole('button', { name: 'More' }));
  expect(screen.getByText('inside')).toBeTruthy();
  await userEvent.click(screen.getByRole('button', { name: 'More' }));
  rerender(<Disclosure label="More" heldOpen><Text>inside</Text></Disclosure>);
  expect(screen.getByText('inside')).toBeTruthy();
});
