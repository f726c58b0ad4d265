'use client';
import { Button } from 'react-aria-components/Button';
import { Label } from 'react-aria-components/Label';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import { Select, SelectValue } from 'react-aria-components/Select';
import styles from './ui.module.css';

/** One of many, from a list. */
export function Pick<T extends string>({ label, value, options, onChange }: { label: string; value: T; options: readonly { value: T; text: string }[]; onChange: (value: T) => void }) {
  return (
    <Select className={styles.field} value={value} onChange={(next) => next !== null && onChange(next as T)}>
      <Label className={styles.label}>{label}</Label>
      <Button className={styles.pick}>
        <SelectValue />
        <span aria-hidden="true">▾</span>
      </Button>
      <Popover className={styles.popover} offset={2}>
        <ListBox className={styles.list} items={options.map((option) => ({ ...option, id: option.value }))}>
          {(option) => (
            <ListBoxItem id={option.value} textValue={option.text} className={styles.listItem}>
              {option.text}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </Select>
  );
}
