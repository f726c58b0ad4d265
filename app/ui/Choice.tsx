'use client';
import { Label } from 'react-aria-components/Label';
import { Radio, RadioGroup } from 'react-aria-components/RadioGroup';
import styles from './ui.module.css';

/** One of a few, all in sight. */
export function Choice<T extends string>({ label, value, options, onChange, quiet = false }: {
  label: string;
  value: T;
  options: readonly { value: T; text: string }[];
  onChange: (value: T) => void;
  /** The label is only spoken. */
  quiet?: boolean;
}) {
  return (
    <RadioGroup className={styles.choice} value={value} onChange={(next) => onChange(next as T)} orientation="horizontal" {...(quiet ? { 'aria-label': label } : {})}>
      {!quiet && <Label className={styles.label}>{label}</Label>}
      <div className={styles.options}>
        {options.map((option) => (
          <Radio key={option.value} value={option.value} className={styles.option}>
            {option.text}
          </Radio>
        ))}
      </div>
    </RadioGroup>
  );
}
