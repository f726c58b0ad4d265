'use client';
import type { ClipboardEvent } from 'react';
import { Button } from '../ui/Button';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { emptyRow, pasted, POINT_FIELDS } from './advisoryForm';
import type { PointField, PointRow } from './advisoryForm';
import styles from './Forecasts.module.css';

const text = words.forecasts.form;

/** The points as a table of cells: add and remove rows, or paste many from a spreadsheet. */
export function PointsEditor({ rows, errors, onChange }: { rows: readonly PointRow[]; errors: ReadonlyMap<string, string>; onChange: (rows: PointRow[]) => void }) {
  const write = (at: number, field: PointField, value: string): void => onChange(rows.map((row, i) => (i === at ? { ...row, [field]: value } : row)));
  const paste = (event: ClipboardEvent, at: number, field: PointField): void => {
    const clipboard = event.clipboardData.getData('text/plain');
    if (!/[\t\n]/.test(clipboard.trim())) return;
    event.preventDefault();
    onChange(pasted(rows, at, field, clipboard));
  };
  return (
    <>
      <div className={`${styles.wide} scroll`}>
        <table className={`${ui.table} ${styles.editor}`}>
          <thead>
            <tr>
              {POINT_FIELDS.map((field) => (
                <th key={field} scope="col">
                  {text.columns[field]}
                </th>
              ))}
              <th scope="col">
                <span className="unseen">{text.removeHead}</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row, i) => (
              <tr key={row.key}>
                {POINT_FIELDS.map((field) => {
                  const error = errors.get(`${row.key}.${field}`);
                  const id = `error-${row.key}-${field}`;
                  return (
                    <td key={field} data-field={field}>
                      <input
                        className={ui.input}
                        value={row[field]}
                        aria-label={text.cell(text.columns[field], i + 1)}
                        aria-invalid={error ? true : undefined}
                        aria-describedby={error ? id : undefined}
                        onChange={(event) => write(i, field, event.target.value)}
                        onPaste={(event) => paste(event, i, field)}
                      />
                      {error && (
                        <span id={id} className={ui.error}>
                          {error}
                        </span>
                      )}
                    </td>
                  );
                })}
                <td>
                  <Button aria-label={text.remove(i + 1)} isDisabled={rows.length === 1} onPress={() => onChange(rows.filter((_, at) => at !== i))}>
                    −
                  </Button>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <div>
        <Button onPress={() => onChange([...rows, emptyRow(Math.max(-1, ...rows.map((row) => row.key)) + 1)])}>{text.add}</Button>
      </div>
    </>
  );
}
