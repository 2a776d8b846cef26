import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import type { Reading } from '#shared/firing/types.ts';
import { TypedGrid } from '../../../../src/write/record/TypedGrid.tsx';
import type { TypedRow } from '../../../../src/write/record/typed-rows.ts';

interface Options {
  readonly start?: TypedRow[];
  readonly unit?: 'C' | 'F';
  readonly onTooMany?: (readings: readonly Reading[]) => void;
}

function Kept({ start = [], unit = 'C', onTooMany = () => undefined }: Options) {
  const [rows, setRows] = useState(start);
  return (
    <>
      <TypedGrid
        rows={rows}
        onRows={setRows}
        unit={unit}
        onTooMany={onTooMany}
        onCountFrom={() => undefined}
      />
      <p data-testid="kept">{JSON.stringify(rows)}</p>
    </>
  );
}

const kept = () => JSON.parse(screen.getByTestId('kept').textContent) as TypedRow[];
const minute = (row: number) => screen.getByRole('textbox', { name: `Minute, row ${row}` });
const degrees = (row: number, unit = 'C') =>
  screen.getByRole('textbox', { name: `Degrees ${unit}, row ${row}` });

describe('TypedGrid', () => {
  it('is filled with figures and Enter alone: a new row is always there', async () => {
    const user = userEvent.setup();
    render(<Kept />);
    await user.click(minute(1));
    await user.keyboard('0{Enter}20{Enter}0:12{Enter}310,5{Enter}');
    expect(kept()).toEqual([
      { minute: 0, celsius: 20 },
      { minute: 12, celsius: 310.5 },
    ]);
    expect(minute(3)).toHaveFocus();
  });

  it('goes on with Tab from a temperature to the next minute, and out at the end', async () => {
    const user = userEvent.setup();
    render(<Kept />);
    await user.click(minute(1));
    await user.keyboard('5{Tab}100{Tab}');
    expect(minute(2)).toHaveFocus();
    await user.tab();
    await user.tab();
    expect(minute(2)).not.toHaveFocus();
    expect(degrees(2)).not.toHaveFocus();
  });

  it('takes °F where the member types °F, and keeps °C', async () => {
    const user = userEvent.setup();
    render(<Kept unit="F" />);
    await user.type(degrees(1, 'F'), '1850');
    expect(kept()).toEqual([{ minute: null, celsius: 1010 }]);
    expect(degrees(1, 'F')).toHaveValue('1850');
  });

  it('fills rows from two pasted columns and tells which lines it could not read', async () => {
    const user = userEvent.setup();
    render(<Kept start={[{ minute: 0, celsius: 20 }]} />);
    await user.click(minute(2));
    await user.paste('1:05\t930\nno reading here\n70\t990\n');
    expect(kept()).toEqual([
      { minute: 0, celsius: 20 },
      { minute: 65, celsius: 930 },
      { minute: 70, celsius: 990 },
    ]);
    expect(screen.getByRole('status')).toHaveTextContent('2 rows pasted.');
    expect(screen.getByText('Line 2')).toBeInTheDocument();
  });

  it('hands a paste over the limit on, whole, and leaves the rows as they were', async () => {
    const user = userEvent.setup();
    const onTooMany = vi.fn();
    render(<Kept start={[{ minute: 0, celsius: 20 }]} onTooMany={onTooMany} />);
    await user.click(minute(2));
    await user.paste(Array.from({ length: 600 }, (_, at) => `${at + 1}\t${at}`).join('\n'));
    expect(onTooMany).toHaveBeenCalledOnce();
    expect(onTooMany.mock.calls[0]?.[0]).toHaveLength(601);
    expect(kept()).toHaveLength(1);
  });

  it('lets a row go once both its cells are cleared and it is left', async () => {
    const user = userEvent.setup();
    render(
      <Kept
        start={[
          { minute: 0, celsius: 20 },
          { minute: 5, celsius: 90 },
        ]}
      />,
    );
    await user.clear(minute(1));
    await user.clear(degrees(1));
    expect(kept()).toHaveLength(2);
    await user.click(minute(3));
    expect(kept()).toEqual([{ minute: 5, celsius: 90 }]);
  });

  it('keeps in sight what it cannot read, and says so', async () => {
    const user = userEvent.setup();
    render(<Kept />);
    await user.type(minute(1), 'soon');
    await user.click(degrees(1));
    const cell = screen.getByRole('textbox', { name: /^Minute, row 1: Write/ });
    expect(cell).toHaveValue('soon');
    expect(cell).toBeInvalid();
    expect(kept()).toEqual([]);
  });

  it('offers to sort rows that run backwards', async () => {
    const user = userEvent.setup();
    render(
      <Kept
        start={[
          { minute: 5, celsius: 90 },
          { minute: 0, celsius: 20 },
        ]}
      />,
    );
    await user.click(screen.getByRole('button', { name: 'Sort by minute' }));
    expect(kept().map((row) => row.minute)).toEqual([0, 5]);
    expect(screen.queryByRole('button', { name: 'Sort by minute' })).toBeNull();
  });
});
