import { UNKNOWN } from '../../lib/units';
import ui from '../ui/ui.module.css';
import { words } from '../words';

const text = words.layers;

/** Rows that could not be used, each with its place and the reason. */
export function RowErrors({ rows }: { rows: readonly { row: number | null; column?: string | undefined; message: string }[] }) {
  return (
    <table className={ui.table}>
      <thead>
        <tr>
          <th scope="col" className="number">{text.row}</th>
          <th scope="col">{text.column}</th>
          <th scope="col">{text.problem}</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((one, i) => (
          <tr key={i}>
            <td className="number">{one.row ?? UNKNOWN}</td>
            <td>{one.column ?? ''}</td>
            <td>{one.message}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
