import type { InputError } from '../../lib/advisory';
import { words } from '../words';
import styles from './Forecasts.module.css';
import { quoteErrors } from './source';

/** Errors or warnings, each with its line and column and the line itself. */
export function Placed({ items, source, label }: { items: readonly InputError[]; source: string | null; label: string }) {
  if (items.length === 0) return null;
  return (
    <ol className={styles.placed} aria-label={label}>
      {quoteErrors(items, source).map(({ error, quote, caret }, i) => (
        <li key={i}>
          <p>
            {error.line !== undefined && <strong>{words.forecasts.place(error.line, error.column)}: </strong>}
            {error.line === undefined && error.path && <strong>{error.path}: </strong>}
            {error.message}
          </p>
          {quote !== null && quote.trim() !== '' && (
            <pre tabIndex={0}>
              {quote}
              {caret !== null && `\n${caret}`}
            </pre>
          )}
        </li>
      ))}
    </ol>
  );
}
