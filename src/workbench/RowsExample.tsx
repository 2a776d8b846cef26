import { useState } from 'react';
import { FORMS } from '#shared/vocabulary/ware.ts';
import type { Form } from '#shared/vocabulary/ware.ts';
import { FieldRow } from '../ui/FieldRow.tsx';
import { NumberField } from '../ui/NumberField.tsx';
import { optionsOf } from '../ui/options.ts';
import { RowsEditor } from '../ui/RowsEditor.tsx';
import { SelectField } from '../ui/SelectField.tsx';

interface PieceRow {
  readonly id: string;
  readonly form: Form | null;
  readonly count: number | null;
}

const freshId = () => Math.random().toString(36).slice(2);

export function RowsExample() {
  const [rows, setRows] = useState<readonly PieceRow[]>([
    { id: 'a', form: 'bowl', count: 2 },
    { id: 'b', form: 'flat-plate', count: 1 },
  ]);
  return (
    <RowsEditor
      rows={rows}
      onRows={setRows}
      newRow={() => ({ id: freshId(), form: null, count: null })}
      copyOf={(row) => ({ ...row, id: freshId() })}
      nameOf={(_, index) => `Piece ${index + 1}`}
      addWords="Add a piece"
      least={1}
      most={30}
      renderRow={(row, change) => (
        <FieldRow>
          <SelectField
            label="Form"
            value={row.form}
            onValue={(form) => change({ ...row, form })}
            options={optionsOf(FORMS)}
            required
          />
          <NumberField
            label="How many alike"
            value={row.count}
            onValue={(count) => change({ ...row, count })}
            min={1}
            max={200}
            decimals={0}
            required
          />
        </FieldRow>
      )}
    />
  );
}
