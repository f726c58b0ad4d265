'use client';
import { FieldError } from 'react-aria-components/FieldError';
import { Input } from 'react-aria-components/Input';
import { Label } from 'react-aria-components/Label';
import { TextArea } from 'react-aria-components/TextArea';
import { TextField } from 'react-aria-components/TextField';
import styles from './ui.module.css';

/** A line (or some lines) of text with its label above and what is wrong with it below. */
export function Field({ label, value, onChange, lines = 1, error, required = false, type = 'text', placeholder, name, mono = false }: {
  label: string;
  value: string;
  onChange: (value: string) => void;
  lines?: number;
  error?: string | undefined;
  required?: boolean;
  type?: 'text' | 'password';
  placeholder?: string;
  name?: string;
  mono?: boolean;
}) {
  const named = name === undefined ? {} : { name };
  return (
    <TextField className={styles.field} value={value} onChange={onChange} isInvalid={Boolean(error)} isRequired={required} type={type} {...named} validationBehavior="aria">
      <Label className={styles.label}>{label}</Label>
      {lines === 1 ? <Input className={styles.input} placeholder={placeholder} autoComplete="off" /> : <TextArea className={`${styles.input} ${mono ? styles.mono : ''}`} rows={lines} placeholder={placeholder} spellCheck={!mono} />}
      {error && <FieldError className={styles.error}>{error}</FieldError>}
    </TextField>
  );
}
